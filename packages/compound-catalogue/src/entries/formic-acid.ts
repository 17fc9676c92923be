import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000203');

/** Formate near pH 7.4: one proton. */
export const formicAcid: CatalogueEntry = {
  id: 'formic-acid',
  body: {
    name: 'formic acid',
    formula: 'CH2O2',
    casNumber: '64-18-6',
    molarMassGramsPerMole: 46.025,
    spinSystems: [
      {
        label: 'formyl',
        count: 1,
        groups: [
          { label: 'C1H', shiftPpm: 8.448, shiftScale: 'DSS', spins: [{ label: 'H4', protonCount: 1 }], source },
        ],
        couplings: [],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
