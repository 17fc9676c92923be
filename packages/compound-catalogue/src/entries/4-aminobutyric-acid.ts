import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, geminalCouplingSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000871');

/**
 * Three CH2 groups near pH 7.4. The protons of each are equivalent in shift only, so that each pair of groups has two
 * couplings, J and J': the table gives four values a pair, of which those that symmetry makes equal are averaged. The
 * geminal couplings of the table (-17.3, -11.6, -12.4 Hz) contradict a measured FID and are replaced.
 */
export const aminobutyricAcid: CatalogueEntry = {
  id: '4-aminobutyric-acid',
  body: {
    name: '4-aminobutyric acid',
    formula: 'C4H9NO2',
    casNumber: '56-12-2',
    molarMassGramsPerMole: 103.121,
    spinSystems: [
      {
        label: 'butanoate chain',
        count: 1,
        groups: [
          {
            label: 'C3H2',
            shiftPpm: 1.8933,
            shiftScale: 'DSS',
            spins: [
              { label: 'H8', protonCount: 1 },
              { label: 'H9', protonCount: 1 },
            ],
            source,
          },
          {
            label: 'C2H2',
            shiftPpm: 2.2861,
            shiftScale: 'DSS',
            spins: [
              { label: 'H10', protonCount: 1 },
              { label: 'H11', protonCount: 1 },
            ],
            source,
          },
          {
            label: 'C4H2',
            shiftPpm: 2.9974,
            shiftScale: 'DSS',
            spins: [
              { label: 'H12', protonCount: 1 },
              { label: 'H13', protonCount: 1 },
            ],
            source,
          },
        ],
        couplings: [
          { label: '2J(C3H2)', pairs: [['H8', 'H9']], couplingHz: -13, kind: 'geminal', source: geminalCouplingSource },
          {
            label: '2J(C2H2)',
            pairs: [['H10', 'H11']],
            couplingHz: -13,
            kind: 'geminal',
            source: geminalCouplingSource,
          },
          {
            label: '2J(C4H2)',
            pairs: [['H12', 'H13']],
            couplingHz: -13,
            kind: 'geminal',
            source: geminalCouplingSource,
          },
          {
            label: 'J(C2H2,C3H2)',
            pairs: [
              ['H8', 'H10'],
              ['H9', 'H11'],
            ],
            couplingHz: 7.5025,
            kind: 'vicinal',
            source: `${source}; mean of 7.194 and 7.811 Hz`,
          },
          {
            label: "J'(C2H2,C3H2)",
            pairs: [
              ['H8', 'H11'],
              ['H9', 'H10'],
            ],
            couplingHz: 7.5855,
            kind: 'vicinal',
            source: `${source}; mean of 8.413 and 6.758 Hz`,
          },
          {
            label: 'J(C3H2,C4H2)',
            pairs: [
              ['H8', 'H12'],
              ['H9', 'H13'],
            ],
            couplingHz: 5.9895,
            kind: 'vicinal',
            source: `${source}; mean of 6.335 and 5.644 Hz`,
          },
          {
            label: "J'(C3H2,C4H2)",
            pairs: [
              ['H8', 'H13'],
              ['H9', 'H12'],
            ],
            couplingHz: 9.224,
            kind: 'vicinal',
            source: `${source}; mean of 8.905 and 9.543 Hz`,
          },
        ],
      },
    ],
    sources: [source, geminalCouplingSource, atomicWeightsSource],
  },
};
