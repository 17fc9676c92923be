import type { CatalogueEntry } from './catalogue-entry.ts';
import { aminobutyricAcid } from './entries/4-aminobutyric-acid.ts';
import { aceticAcid } from './entries/acetic-acid.ts';
import { alanine } from './entries/alanine.ts';
import { alphaDGlucose } from './entries/alpha-d-glucose.ts';
import { betaDGlucose } from './entries/beta-d-glucose.ts';
import { butyricAcid } from './entries/butyric-acid.ts';
import { citricAcid } from './entries/citric-acid.ts';
import { ethanol } from './entries/ethanol.ts';
import { ethylCrotonate } from './entries/ethyl-crotonate.ts';
import { formicAcid } from './entries/formic-acid.ts';
import { glycerol } from './entries/glycerol.ts';
import { lGlutamicAcid } from './entries/l-glutamic-acid.ts';
import { lacticAcid } from './entries/lactic-acid.ts';
import { malicAcid } from './entries/malic-acid.ts';
import { methanol } from './entries/methanol.ts';
import { succinicAcid } from './entries/succinic-acid.ts';
import { tetramethylsilane } from './entries/tetramethylsilane.ts';
import { trimethylsilylpropanesulfonate } from './entries/trimethylsilylpropanesulfonate-d6.ts';
import { trimethylsilylpropanoate } from './entries/trimethylsilylpropanoate-d4.ts';

const entries: readonly CatalogueEntry[] = [
  trimethylsilylpropanoate,
  trimethylsilylpropanesulfonate,
  tetramethylsilane,
  aminobutyricAcid,
  formicAcid,
  butyricAcid,
  lGlutamicAcid,
  ethylCrotonate,
  lacticAcid,
  aceticAcid,
  malicAcid,
  succinicAcid,
  glycerol,
  ethanol,
  methanol,
  alanine,
  citricAcid,
  alphaDGlucose,
  betaDGlucose,
];

/** The compounds that a new laboratory begins with: three shift references, then analytes. Copies: yours to change. */
export function starterCatalogue(): CatalogueEntry[] {
  return structuredClone([...entries]);
}
