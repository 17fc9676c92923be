import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000191');

/** Acetate near pH 7.4: one CH3. */
export const aceticAcid: CatalogueEntry = {
  id: 'acetic-acid',
  body: {
    name: 'acetic acid',
    formula: 'C2H4O2',
    casNumber: '64-19-7',
    molarMassGramsPerMole: 60.052,
    spinSystems: [
      {
        label: 'methyl',
        count: 1,
        groups: [
          { label: 'C2H3', shiftPpm: 1.905, shiftScale: 'DSS', spins: [{ label: 'H5', protonCount: 3 }], source },
        ],
        couplings: [],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
