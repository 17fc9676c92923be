import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000297');

/** In water, where the OH exchanges. */
export const ethanol: CatalogueEntry = {
  id: 'ethanol',
  body: {
    name: 'ethanol',
    formula: 'C2H6O',
    casNumber: '64-17-5',
    molarMassGramsPerMole: 46.069,
    spinSystems: [
      {
        label: 'ethyl',
        count: 1,
        groups: [
          { label: 'C2H3', shiftPpm: 1.1696, shiftScale: 'DSS', spins: [{ label: 'H4', protonCount: 3 }], source },
          { label: 'C1H2', shiftPpm: 3.6408, shiftScale: 'DSS', spins: [{ label: 'H7', protonCount: 2 }], source },
        ],
        couplings: [{ label: 'J(C1H2,C2H3)', pairs: [['H4', 'H7']], couplingHz: 7.094, kind: 'vicinal', source }],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
