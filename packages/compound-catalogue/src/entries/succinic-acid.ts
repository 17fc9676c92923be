import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000118');

/**
 * Succinate near pH 7.4: four protons of one shift, whose couplings do not show. The row of the disodium salt is used;
 * the row of the acid (2.5612 ppm, bmse000968) lies between its protonation states, with pKa 4.2 and 5.6.
 */
export const succinicAcid: CatalogueEntry = {
  id: 'succinic-acid',
  body: {
    name: 'succinic acid',
    formula: 'C4H6O4',
    casNumber: '110-15-6',
    molarMassGramsPerMole: 118.088,
    spinSystems: [
      {
        label: 'ethylene',
        count: 1,
        groups: [
          { label: 'C2H2,C3H2', shiftPpm: 2.3914, shiftScale: 'DSS', spins: [{ label: 'H9', protonCount: 4 }], source },
        ],
        couplings: [],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
