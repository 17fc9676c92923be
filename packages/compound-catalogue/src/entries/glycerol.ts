import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000856');

/** Two CH2 groups that mirror each other: their protons fall into two pairs of equal shift. */
export const glycerol: CatalogueEntry = {
  id: 'glycerol',
  body: {
    name: 'glycerol',
    formula: 'C3H8O3',
    casNumber: '56-81-5',
    molarMassGramsPerMole: 92.094,
    spinSystems: [
      {
        label: 'propane chain',
        count: 1,
        groups: [
          {
            label: 'C1Ha,C3Ha',
            shiftPpm: 3.6387,
            shiftScale: 'DSS',
            spins: [
              { label: 'H7', protonCount: 1 },
              { label: 'H10', protonCount: 1 },
            ],
            source,
          },
          {
            label: 'C1Hb,C3Hb',
            shiftPpm: 3.5478,
            shiftScale: 'DSS',
            spins: [
              { label: 'H8', protonCount: 1 },
              { label: 'H9', protonCount: 1 },
            ],
            source,
          },
          { label: 'C2H', shiftPpm: 3.7712, shiftScale: 'DSS', spins: [{ label: 'H11', protonCount: 1 }], source },
        ],
        couplings: [
          {
            label: '2J(CH2)',
            pairs: [
              ['H7', 'H8'],
              ['H9', 'H10'],
            ],
            couplingHz: -11.859,
            kind: 'geminal',
            source,
          },
          {
            label: 'J(CHa,C2H)',
            pairs: [
              ['H7', 'H11'],
              ['H10', 'H11'],
            ],
            couplingHz: 4.56,
            kind: 'vicinal',
            source,
          },
          {
            label: 'J(CHb,C2H)',
            pairs: [
              ['H8', 'H11'],
              ['H9', 'H11'],
            ],
            couplingHz: 6.577,
            kind: 'vicinal',
            source,
          },
        ],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
