import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000015');

/** The alpha anomer alone: in water it stands in equilibrium with the beta anomer, which is an entry of its own. */
export const alphaDGlucose: CatalogueEntry = {
  id: 'alpha-d-glucose',
  body: {
    name: 'alpha-D-glucopyranose',
    formula: 'C6H12O6',
    casNumber: '492-62-6',
    molarMassGramsPerMole: 180.156,
    spinSystems: [
      {
        label: 'pyranose ring',
        count: 1,
        groups: [
          { label: 'C1H', shiftPpm: 5.2223, shiftScale: 'DSS', spins: [{ label: 'H43', protonCount: 1 }], source },
          { label: 'C2H', shiftPpm: 3.5235, shiftScale: 'DSS', spins: [{ label: 'H42', protonCount: 1 }], source },
          { label: 'C3H', shiftPpm: 3.7032, shiftScale: 'DSS', spins: [{ label: 'H41', protonCount: 1 }], source },
          { label: 'C4H', shiftPpm: 3.3998, shiftScale: 'DSS', spins: [{ label: 'H40', protonCount: 1 }], source },
          { label: 'C5H', shiftPpm: 3.824, shiftScale: 'DSS', spins: [{ label: 'H39', protonCount: 1 }], source },
          { label: 'C6Ha', shiftPpm: 3.7555, shiftScale: 'DSS', spins: [{ label: 'H37', protonCount: 1 }], source },
          { label: 'C6Hb', shiftPpm: 3.8286, shiftScale: 'DSS', spins: [{ label: 'H38', protonCount: 1 }], source },
        ],
        couplings: [
          { label: 'J(C1H,C2H)', pairs: [['H42', 'H43']], couplingHz: 3.874, kind: 'vicinal', source },
          { label: 'J(C2H,C3H)', pairs: [['H41', 'H42']], couplingHz: 9.736, kind: 'vicinal', source },
          { label: 'J(C3H,C4H)', pairs: [['H40', 'H41']], couplingHz: 9.755, kind: 'vicinal', source },
          { label: 'J(C4H,C5H)', pairs: [['H39', 'H40']], couplingHz: 9.345, kind: 'vicinal', source },
          { label: 'J(C5H,C6Ha)', pairs: [['H37', 'H39']], couplingHz: 5.135, kind: 'vicinal', source },
          { label: 'J(C5H,C6Hb)', pairs: [['H38', 'H39']], couplingHz: 2.485, kind: 'vicinal', source },
          { label: '2J(C6H2)', pairs: [['H37', 'H38']], couplingHz: -12.299, kind: 'geminal', source },
        ],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
