import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, scaleDefinition, siliconSource } from '../citations.ts';

/** TSP: its methyl singlet is 0 ppm of the TSP scale. The four CH2 protons are deuterium. */
export const trimethylsilylpropanoate: CatalogueEntry = {
  id: 'trimethylsilylpropanoate-d4',
  body: {
    name: 'sodium 3-(trimethylsilyl)propanoate-2,2,3,3-d4 (TSP)',
    formula: 'C6H9D4NaO2Si',
    casNumber: '24493-21-8',
    molarMassGramsPerMole: 172.267,
    spinSystems: [
      {
        label: 'trimethylsilyl',
        count: 1,
        groups: [
          {
            label: 'Si(CH3)3',
            shiftPpm: 0,
            shiftScale: 'TSP',
            spins: [{ label: 'SiMe3', protonCount: 9 }],
            source: scaleDefinition,
          },
        ],
        couplings: [],
        satellites: [
          {
            nucleus: '29Si',
            groupLabel: 'Si(CH3)3',
            couplingHz: 6.6,
            abundanceFraction: 0.0467,
            source: siliconSource,
          },
        ],
      },
    ],
    sources: [siliconSource, scaleDefinition, atomicWeightsSource],
    scaleZero: 'TSP',
  },
};
