import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000904');

/** Malate near pH 7.4: three protons of different shift. The enantiomers have one spectrum. */
export const malicAcid: CatalogueEntry = {
  id: 'malic-acid',
  body: {
    name: 'malic acid',
    formula: 'C4H6O5',
    casNumber: '6915-15-7',
    molarMassGramsPerMole: 134.087,
    spinSystems: [
      {
        label: 'butanedioate chain',
        count: 1,
        groups: [
          { label: 'C2H', shiftPpm: 4.2885, shiftScale: 'DSS', spins: [{ label: 'H12', protonCount: 1 }], source },
          { label: 'C3Ha', shiftPpm: 2.354, shiftScale: 'DSS', spins: [{ label: 'H10', protonCount: 1 }], source },
          { label: 'C3Hb', shiftPpm: 2.6574, shiftScale: 'DSS', spins: [{ label: 'H11', protonCount: 1 }], source },
        ],
        couplings: [
          { label: '2J(C3H2)', pairs: [['H10', 'H11']], couplingHz: -15.684, kind: 'geminal', source },
          { label: 'J(C2H,C3Ha)', pairs: [['H10', 'H12']], couplingHz: 10.119, kind: 'vicinal', source },
          { label: 'J(C2H,C3Hb)', pairs: [['H11', 'H12']], couplingHz: 2.932, kind: 'vicinal', source },
        ],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
