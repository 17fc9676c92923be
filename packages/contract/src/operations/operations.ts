import { acquisitionOperations } from './acquisition-operations.ts';
import { documentOperations } from './document-operations.ts';
import { fitOperations } from './fit-operations.ts';
import type { Operation } from './operation.ts';
import { serviceOperations } from './service-operations.ts';

/** Every operation of the interface, by operationId. */
export const operations = {
  ...acquisitionOperations,
  ...documentOperations,
  ...fitOperations,
  ...serviceOperations,
} as const satisfies Record<string, Operation>;

/** The name of one operation. */
export type OperationId = keyof typeof operations;
