export type { FileConditions } from './declared-conditions.ts';
export { type Fault, type FaultCode, faultCodes } from './fault-list.ts';
export { type ReadAcquisition, type Reading, readAcquisition } from './read-acquisition.ts';
export { readJsonSignal } from './read-json-signal.ts';
export { type ReadingLimits, readingLimits } from './reading-limits.ts';
export { type OrdinateForm, UnwritableAcquisitionError, writeAcquisition } from './write-acquisition.ts';
