import type { OperationId } from '@spinassay/contract';
import type { Handler } from './http/answer.ts';
import { createAcquisition } from './routes/create-acquisition/handler.ts';
import { createCompound } from './routes/create-compound/handler.ts';
import { createFit } from './routes/create-fit/handler.ts';
import { createMethod } from './routes/create-method/handler.ts';
import { createPreparation } from './routes/create-preparation/handler.ts';
import { listCompounds } from './routes/list-compounds/handler.ts';
import { listMethods } from './routes/list-methods/handler.ts';
import { readAcquisition } from './routes/read-acquisition/handler.ts';
import { readCompound } from './routes/read-compound/handler.ts';
import { readDocumentation } from './routes/read-documentation/handler.ts';
import { readFit } from './routes/read-fit/handler.ts';
import { readHealth } from './routes/read-health/handler.ts';
import { readMethod } from './routes/read-method/handler.ts';
import { readOpenApi } from './routes/read-open-api/handler.ts';
import { readOriginal } from './routes/read-original/handler.ts';
import { readPreparation } from './routes/read-preparation/handler.ts';
import { readProblemPage } from './routes/read-problem-page/handler.ts';
import { readReadiness } from './routes/read-readiness/handler.ts';
import { readResult } from './routes/read-result/handler.ts';
import { readResultFeed } from './routes/read-result-feed/handler.ts';

/** One handler for each operation of the contract; the compiler holds the two equal. */
export const handlers: Readonly<Record<OperationId, Handler>> = {
  createAcquisition,
  createCompound,
  createFit,
  createMethod,
  createPreparation,
  listCompounds,
  listMethods,
  readAcquisition,
  readCompound,
  readDocumentation,
  readFit,
  readHealth,
  readMethod,
  readOpenApi,
  readOriginal,
  readPreparation,
  readProblemPage,
  readReadiness,
  readResult,
  readResultFeed,
};
