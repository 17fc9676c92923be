import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000979');

/** Lactate near pH 7.4. The enantiomers have one spectrum. */
export const lacticAcid: CatalogueEntry = {
  id: 'lactic-acid',
  body: {
    name: 'lactic acid',
    formula: 'C3H6O3',
    casNumber: '50-21-5',
    molarMassGramsPerMole: 90.078,
    spinSystems: [
      {
        label: 'propanoate chain',
        count: 1,
        groups: [
          { label: 'C3H3', shiftPpm: 1.3158, shiftScale: 'DSS', spins: [{ label: 'H7', protonCount: 3 }], source },
          { label: 'C2H', shiftPpm: 4.0994, shiftScale: 'DSS', spins: [{ label: 'H10', protonCount: 1 }], source },
        ],
        couplings: [{ label: 'J(C2H,C3H3)', pairs: [['H7', 'H10']], couplingHz: 7.028, kind: 'vicinal', source }],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
