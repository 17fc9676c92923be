import { operations } from '@spinassay/contract';
import { readDocument } from '../../documents/read-document.ts';
import type { Handler } from '../../http/answer.ts';

/** `GET /v1/methods/{id}`: one version of a method. */
export const readMethod: Handler = (request, dependencies) =>
  readDocument(request, dependencies, { operation: operations.readMethod, kind: 'method' });
