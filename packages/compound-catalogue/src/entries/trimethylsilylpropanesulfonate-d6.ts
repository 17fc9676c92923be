import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, scaleDefinition, siliconSource } from '../citations.ts';

/**
 * DSS-d6: its methyl singlet is 0 ppm of the DSS scale. The six CH2 protons are deuterium; undeuterated DSS, with
 * signals near 0.63, 1.75 and 2.91 ppm, is another compound and is not in the starter catalogue.
 */
export const trimethylsilylpropanesulfonate: CatalogueEntry = {
  id: 'trimethylsilylpropanesulfonate-d6',
  body: {
    name: 'sodium 3-(trimethylsilyl)propane-1-sulfonate-d6 (DSS-d6)',
    formula: 'C6H9D6NaO3SSi',
    casNumber: '284664-85-3',
    molarMassGramsPerMole: 224.354,
    spinSystems: [
      {
        label: 'trimethylsilyl',
        count: 1,
        groups: [
          {
            label: 'Si(CH3)3',
            shiftPpm: 0,
            shiftScale: 'DSS',
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
    scaleZero: 'DSS',
  },
};
