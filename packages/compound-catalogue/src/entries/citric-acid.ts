import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000076');

/** Citrate near pH 7.4: two equal CH2 groups that are not coupled with each other. */
export const citricAcid: CatalogueEntry = {
  id: 'citric-acid',
  body: {
    name: 'citric acid',
    formula: 'C6H8O7',
    casNumber: '77-92-9',
    molarMassGramsPerMole: 192.123,
    spinSystems: [
      {
        label: 'methylene',
        count: 2,
        groups: [
          { label: 'CHa', shiftPpm: 2.6426, shiftScale: 'DSS', spins: [{ label: 'H14', protonCount: 1 }], source },
          { label: 'CHb', shiftPpm: 2.5222, shiftScale: 'DSS', spins: [{ label: 'H15', protonCount: 1 }], source },
        ],
        couplings: [{ label: '2J(CH2)', pairs: [['H14', 'H15']], couplingHz: -15.063, kind: 'geminal', source }],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
