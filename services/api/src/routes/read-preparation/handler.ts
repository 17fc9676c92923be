import { operations } from '@spinassay/contract';
import { readDocument } from '../../documents/read-document.ts';
import type { Handler } from '../../http/answer.ts';

/** `GET /v1/preparations/{id}`: one version of a preparation. */
export const readPreparation: Handler = (request, dependencies) =>
  readDocument(request, dependencies, { operation: operations.readPreparation, kind: 'preparation' });
