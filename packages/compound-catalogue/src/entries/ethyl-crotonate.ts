import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource } from '../citations.ts';

const source = 'textbook values in CDCl3, from memory';

/** In CDCl3, on the TMS scale. Two chains without a coupling between them. */
export const ethylCrotonate: CatalogueEntry = {
  id: 'ethyl-crotonate',
  body: {
    name: 'ethyl (E)-but-2-enoate (ethyl crotonate)',
    formula: 'C6H10O2',
    casNumber: '623-70-1',
    molarMassGramsPerMole: 114.144,
    spinSystems: [
      {
        label: 'propenyl',
        count: 1,
        groups: [
          { label: 'C4H3', shiftPpm: 1.87, shiftScale: 'TMS', spins: [{ label: 'H4', protonCount: 3 }], source },
          { label: 'C3H', shiftPpm: 6.97, shiftScale: 'TMS', spins: [{ label: 'H3', protonCount: 1 }], source },
          { label: 'C2H', shiftPpm: 5.84, shiftScale: 'TMS', spins: [{ label: 'H2', protonCount: 1 }], source },
        ],
        couplings: [
          { label: 'J(C3H,C4H3)', pairs: [['H3', 'H4']], couplingHz: 6.9, kind: 'vicinal', source },
          { label: 'J(C2H,C3H)', pairs: [['H2', 'H3']], couplingHz: 15.5, kind: 'vicinal', source },
          { label: '4J(C2H,C4H3)', pairs: [['H2', 'H4']], couplingHz: -1.7, kind: 'long-range', source },
        ],
      },
      {
        label: 'ethyl',
        count: 1,
        groups: [
          { label: 'OCH2', shiftPpm: 4.18, shiftScale: 'TMS', spins: [{ label: "H1'", protonCount: 2 }], source },
          { label: 'CH3', shiftPpm: 1.28, shiftScale: 'TMS', spins: [{ label: "H2'", protonCount: 3 }], source },
        ],
        couplings: [{ label: 'J(OCH2,CH3)', pairs: [["H1'", "H2'"]], couplingHz: 7.1, kind: 'vicinal', source }],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
