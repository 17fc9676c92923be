import { operations } from '@spinassay/contract';
import { listDocuments } from '../../documents/list-documents.ts';
import type { Handler } from '../../http/answer.ts';

/** `GET /v1/methods`: the latest version of each method. */
export const listMethods: Handler = (request, dependencies) =>
  listDocuments(request, dependencies, { operation: operations.listMethods, kind: 'method' });
