import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000402');

/** Butyrate near pH 7.4. The two CH2 groups have J and J', which the table takes as equal. */
export const butyricAcid: CatalogueEntry = {
  id: 'butyric-acid',
  body: {
    name: 'butyric acid',
    formula: 'C4H8O2',
    casNumber: '107-92-6',
    molarMassGramsPerMole: 88.106,
    spinSystems: [
      {
        label: 'butanoate chain',
        count: 1,
        groups: [
          { label: 'C4H3', shiftPpm: 0.8816, shiftScale: 'DSS', spins: [{ label: 'H7', protonCount: 3 }], source },
          {
            label: 'C3H2',
            shiftPpm: 1.5459,
            shiftScale: 'DSS',
            spins: [
              { label: 'H10', protonCount: 1 },
              { label: 'H11', protonCount: 1 },
            ],
            source,
          },
          {
            label: 'C2H2',
            shiftPpm: 2.1433,
            shiftScale: 'DSS',
            spins: [
              { label: 'H12', protonCount: 1 },
              { label: 'H13', protonCount: 1 },
            ],
            source,
          },
        ],
        couplings: [
          { label: '2J(C3H2)', pairs: [['H10', 'H11']], couplingHz: -12.4, kind: 'geminal', source },
          { label: '2J(C2H2)', pairs: [['H12', 'H13']], couplingHz: -12.4, kind: 'geminal', source },
          {
            label: 'J(C3H2,C4H3)',
            pairs: [
              ['H7', 'H10'],
              ['H7', 'H11'],
            ],
            couplingHz: 7.43,
            kind: 'vicinal',
            source,
          },
          {
            label: 'J(C2H2,C3H2)',
            pairs: [
              ['H10', 'H12'],
              ['H11', 'H13'],
            ],
            couplingHz: 7.345,
            kind: 'vicinal',
            source,
          },
          {
            label: "J'(C2H2,C3H2)",
            pairs: [
              ['H10', 'H13'],
              ['H11', 'H12'],
            ],
            couplingHz: 7.345,
            kind: 'vicinal',
            source,
          },
        ],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
