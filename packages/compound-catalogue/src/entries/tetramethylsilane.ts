import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, scaleDefinition, siliconSource } from '../citations.ts';

/**
 * TMS: its singlet is 0 ppm of the TMS scale. Four uncoupled CH3, written as four copies of one: the twelve protons
 * together would be one system of more protons than are computed exactly.
 */
export const tetramethylsilane: CatalogueEntry = {
  id: 'tetramethylsilane',
  body: {
    name: 'tetramethylsilane (TMS)',
    formula: 'C4H12Si',
    casNumber: '75-76-3',
    molarMassGramsPerMole: 88.225,
    spinSystems: [
      {
        label: 'methyl',
        count: 4,
        groups: [
          {
            label: 'SiCH3',
            shiftPpm: 0,
            shiftScale: 'TMS',
            spins: [{ label: 'SiMe', protonCount: 3 }],
            source: scaleDefinition,
          },
        ],
        couplings: [],
        satellites: [
          { nucleus: '29Si', groupLabel: 'SiCH3', couplingHz: 6.6, abundanceFraction: 0.0467, source: siliconSource },
        ],
      },
    ],
    sources: [siliconSource, scaleDefinition, atomicWeightsSource],
    scaleZero: 'TMS',
  },
};
