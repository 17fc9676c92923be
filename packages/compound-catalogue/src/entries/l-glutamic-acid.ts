import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000913');

/** Glutamate near pH 7.4: five protons of different shift. The couplings of 0.05 Hz between C2H and C4H2 are left out. */
export const lGlutamicAcid: CatalogueEntry = {
  id: 'l-glutamic-acid',
  body: {
    name: 'L-glutamic acid',
    formula: 'C5H9NO4',
    casNumber: '56-86-0',
    molarMassGramsPerMole: 147.13,
    spinSystems: [
      {
        label: 'glutamate chain',
        count: 1,
        groups: [
          { label: 'C2H', shiftPpm: 3.7477, shiftScale: 'DSS', spins: [{ label: 'H15', protonCount: 1 }], source },
          { label: 'C3Ha', shiftPpm: 2.1189, shiftScale: 'DSS', spins: [{ label: 'H11', protonCount: 1 }], source },
          { label: 'C3Hb', shiftPpm: 2.0495, shiftScale: 'DSS', spins: [{ label: 'H12', protonCount: 1 }], source },
          { label: 'C4Ha', shiftPpm: 2.3289, shiftScale: 'DSS', spins: [{ label: 'H13', protonCount: 1 }], source },
          { label: 'C4Hb', shiftPpm: 2.3488, shiftScale: 'DSS', spins: [{ label: 'H14', protonCount: 1 }], source },
        ],
        couplings: [
          { label: '2J(C3H2)', pairs: [['H11', 'H12']], couplingHz: -14.942, kind: 'geminal', source },
          { label: '2J(C4H2)', pairs: [['H13', 'H14']], couplingHz: -15.894, kind: 'geminal', source },
          { label: 'J(C2H,C3Ha)', pairs: [['H11', 'H15']], couplingHz: 4.733, kind: 'vicinal', source },
          { label: 'J(C2H,C3Hb)', pairs: [['H12', 'H15']], couplingHz: 7.229, kind: 'vicinal', source },
          { label: 'J(C3Ha,C4Ha)', pairs: [['H11', 'H13']], couplingHz: 8.857, kind: 'vicinal', source },
          { label: 'J(C3Ha,C4Hb)', pairs: [['H11', 'H14']], couplingHz: 6.734, kind: 'vicinal', source },
          { label: 'J(C3Hb,C4Ha)', pairs: [['H12', 'H13']], couplingHz: 6.287, kind: 'vicinal', source },
          { label: 'J(C3Hb,C4Hb)', pairs: [['H12', 'H14']], couplingHz: 8.756, kind: 'vicinal', source },
        ],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
