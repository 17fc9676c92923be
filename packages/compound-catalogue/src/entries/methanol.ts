import type { CatalogueEntry } from '../catalogue-entry.ts';
import { atomicWeightsSource, measuredParameters } from '../citations.ts';

const source = measuredParameters('bmse000294');

/** In water, where the OH exchanges: one CH3. */
export const methanol: CatalogueEntry = {
  id: 'methanol',
  body: {
    name: 'methanol',
    formula: 'CH4O',
    casNumber: '67-56-1',
    molarMassGramsPerMole: 32.042,
    spinSystems: [
      {
        label: 'methyl',
        count: 1,
        groups: [
          { label: 'CH3', shiftPpm: 3.3415, shiftScale: 'DSS', spins: [{ label: 'H3', protonCount: 3 }], source },
        ],
        couplings: [],
      },
    ],
    sources: [source, atomicWeightsSource],
  },
};
