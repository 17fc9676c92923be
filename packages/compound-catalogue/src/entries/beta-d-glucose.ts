import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000015');

/** The beta anomer alone: in water it stands in equilibrium with the alpha anomer, which is an entry of its own. */
export const betaDGlucose: CatalogueEntry = {
  id: 'beta-d-glucose',
  body: {
    name: 'beta-D-glucopyranose',
    formula: 'C6H12O6',
    casNumber: '492-61-5',
    molarMassGramsPerMole: 180.156,
    spinSystems: [
      {
        label: 'pyranose ring',
        count: 1,
        groups: [
          { label: 'C1H', shiftPpm: 4.636, shiftScale: 'DSS', spins: [{ label: 'H12', protonCount: 1 }], source },
          { label: 'C2H', shiftPpm: 3.234, shiftScale: 'DSS', spins: [{ label: 'H18', protonCount: 1 }], source },
          { label: 'C3H', shiftPpm: 3.4771, shiftScale: 'DSS', spins: [{ label: 'H17', protonCount: 1 }], source },
          { label: 'C4H', shiftPpm: 3.3913, shiftScale: 'DSS', spins: [{ label: 'H16', protonCount: 1 }], source },
          { label: 'C5H', shiftPpm: 3.456, shiftScale: 'DSS', spins: [{ label: 'H15', protonCount: 1 }], source },
          { label: 'C6Ha', shiftPpm: 3.886, shiftScale: 'DSS', spins: [{ label: 'H13', protonCount: 1 }], source },
          { label: 'C6Hb', shiftPpm: 3.7121, shiftScale: 'DSS', spins: [{ label: 'H14', protonCount: 1 }], source },
        ],
        couplings: [
          { label: 'J(C1H,C2H)', pairs: [['H12', 'H18']], couplingHz: 8.133, kind: 'vicinal', source },
          { label: 'J(C2H,C3H)', pairs: [['H17', 'H18']], couplingHz: 9.508, kind: 'vicinal', source },
          { label: 'J(C3H,C4H)', pairs: [['H16', 'H17']], couplingHz: 9.108, kind: 'vicinal', source },
          { label: 'J(C4H,C5H)', pairs: [['H15', 'H16']], couplingHz: 9.891, kind: 'vicinal', source },
          { label: 'J(C5H,C6Ha)', pairs: [['H13', 'H15']], couplingHz: 2.1, kind: 'vicinal', source },
          { label: 'J(C5H,C6Hb)', pairs: [['H14', 'H15']], couplingHz: 5.631, kind: 'vicinal', source },
          { label: '5J(C3H,C6Hb)', pairs: [['H14', 'H17']], couplingHz: 0.552, kind: 'long-range', source },
          { label: '2J(C6H2)', pairs: [['H13', 'H14']], couplingHz: -12.299, kind: 'geminal', source },
        ],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
