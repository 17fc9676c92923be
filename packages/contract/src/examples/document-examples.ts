import type {
  Compound,
  CompoundPost,
  DocumentList,
  Method,
  MethodPost,
  Preparation,
  PreparationPost,
} from '../versioned-documents.ts';

const source = 'Govindaraju, Young & Maudsley, NMR Biomed. 13 (2000) 129';
const createdAt = '2026-01-16T08:00:00.000Z';
const sha256 = '9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a08';

/** Acetate: one group of three equivalent protons. */
export const compoundPostExample: CompoundPost = {
  id: 'acetate',
  body: {
    name: 'acetate',
    formula: 'C2H4O2',
    casNumber: '64-19-7',
    molarMassGramsPerMole: 60.052,
    spinSystems: [
      {
        label: 'methyl',
        count: 1,
        groups: [
          { label: 'CH3', shiftPpm: 1.904, shiftScale: 'DSS', spins: [{ label: 'H2', protonCount: 3 }], source },
        ],
        couplings: [],
      },
    ],
    sources: [source],
  },
};

export const compoundExample: Compound = { ...compoundPostExample, version: 1, sha256, createdAt };

/** Shifts and amounts of acetate against TSP. */
export const methodPostExample: MethodPost = {
  id: 'acetate-in-cider',
  body: {
    name: 'Acetate in cider',
    panel: [{ compoundId: 'acetate', shiftSdPpm: 0.02, quantifierGroups: ['CH3'] }],
    reference: { compoundId: 'trimethylsilylpropanoate-d4' },
    standard: { compoundId: 'trimethylsilylpropanoate-d4' },
    claims: ['shifts', 'amounts'],
  },
};

export const methodExample: Method = {
  id: 'acetate-in-cider',
  version: 1,
  sha256,
  createdAt,
  body: {
    ...methodPostExample.body,
    panel: [{ compoundId: 'acetate', compoundVersion: 1, shiftSdPpm: 0.02, quantifierGroups: ['CH3'] }],
    reference: { compoundId: 'trimethylsilylpropanoate-d4', compoundVersion: 1 },
  },
};

/** One tube of tank 4 with its standard. */
export const preparationPostExample: PreparationPost = {
  id: 'tank-4-night-17',
  body: {
    label: 'Tank 4, night of 17 January, tube 1',
    standard: {
      compoundId: 'trimethylsilylpropanoate-d4',
      amountConcentration: { value: 0.5, standardUncertainty: 0.004, unit: 'mmol/L' },
    },
  },
};

export const preparationExample: Preparation = { ...preparationPostExample, version: 1, sha256, createdAt };

export const documentListExample: DocumentList = {
  items: [{ id: 'acetate', version: 1, sha256, createdAt, name: 'acetate' }],
};
