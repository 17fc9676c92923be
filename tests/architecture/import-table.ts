/** What one room may import: rooms of this house, and packages from outside. Node's own modules count as outside. */
export type ImportRule = {
  readonly house: readonly string[];
  /** Rooms of which only types may be taken. */
  readonly houseTypes?: readonly string[];
  readonly outside: readonly string[];
  /** True where `node:` modules may be imported. */
  readonly node: boolean;
  /** What its tests, test support and benchmarks may import besides; vitest, Node and the room itself go without saying. */
  readonly tests?: readonly string[];
};

/** They touch no clock, file, socket, log, environment or `Math.random`: the same in a test, a thread and a browser. */
export const numericRooms = ['units', 'numerics', 'spin-dynamics', 'signal-processing', 'spectrum-inference'] as const;

const services = [
  'contract',
  'problems',
  'acquisition-formats',
  'compound-catalogue',
  'job-queue',
  'store',
  'service-runtime',
];

/** The import table of the house, as data. A room that is not in it fails the test beside this file. */
export const importTable: Readonly<Record<string, ImportRule>> = {
  units: { house: [], outside: [], node: false },
  problems: { house: [], outside: [], node: false },
  numerics: { house: [], outside: ['ml-matrix', 'fft.js'], node: false, tests: ['ml-matrix'] },
  contract: {
    house: ['problems'],
    outside: ['zod', 'yaml'],
    node: true,
    tests: ['ajv', 'ajv-formats', '@seriousme/openapi-schema-validator'],
  },
  'spin-dynamics': { house: ['units', 'numerics'], outside: [], node: false, tests: ['ml-matrix'] },
  'signal-processing': { house: ['units', 'numerics'], outside: [], node: false, tests: ['ml-matrix'] },
  'spectrum-inference': {
    house: ['units', 'numerics', 'spin-dynamics', 'signal-processing'],
    outside: [],
    node: false,
    tests: ['ml-matrix', '@spinassay/signal-generator'],
  },
  'signal-generator': { house: ['units'], outside: [], node: false },
  'acquisition-formats': { house: ['units'], houseTypes: ['contract'], outside: [], node: false },
  'compound-catalogue': {
    house: ['units'],
    houseTypes: ['contract'],
    outside: [],
    node: false,
    tests: ['@spinassay/contract'],
  },
  'job-queue': {
    house: ['contract', 'problems'],
    outside: ['bullmq', 'pg'],
    node: true,
    tests: ['@spinassay/store'],
  },
  store: { house: ['contract', 'problems'], outside: ['pg'], node: true },
  'service-runtime': { house: ['problems'], outside: ['pino'], node: true },
  api: { house: services, outside: ['express', 'swagger-ui-express'], node: true },
  'fit-worker': {
    house: [...services, ...numericRooms],
    outside: [],
    node: true,
    tests: ['@spinassay/signal-generator', 'pg'],
  },
};
