import { operations } from '@spinassay/contract';
import { readDocument } from '../../documents/read-document.ts';
import type { Handler } from '../../http/answer.ts';

/** `GET /v1/compounds/{id}`: one version of a compound. */
export const readCompound: Handler = (request, dependencies) =>
  readDocument(request, dependencies, { operation: operations.readCompound, kind: 'compound' });
