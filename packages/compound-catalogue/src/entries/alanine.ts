import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000028');

/** Near pH 7.4. The enantiomers have one spectrum. */
export const alanine: CatalogueEntry = {
  id: 'alanine',
  body: {
    name: 'alanine',
    formula: 'C3H7NO2',
    casNumber: '302-72-7',
    molarMassGramsPerMole: 89.094,
    spinSystems: [
      {
        label: 'propanoate chain',
        count: 1,
        groups: [
          { label: 'C3H3', shiftPpm: 1.4662, shiftScale: 'DSS', spins: [{ label: 'H7', protonCount: 3 }], source },
          { label: 'C2H', shiftPpm: 3.7674, shiftScale: 'DSS', spins: [{ label: 'H10', protonCount: 1 }], source },
        ],
        couplings: [{ label: 'J(C2H,C3H3)', pairs: [['H7', 'H10']], couplingHz: 7.299, kind: 'vicinal', source }],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
