import { operations } from '@spinassay/contract';
import { listDocuments } from '../../documents/list-documents.ts';
import type { Handler } from '../../http/answer.ts';

/** `GET /v1/compounds`: the latest version of each compound. */
export const listCompounds: Handler = (request, dependencies) =>
  listDocuments(request, dependencies, { operation: operations.listCompounds, kind: 'compound' });
