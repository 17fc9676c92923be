import { methodPostSchema, operations } from '@spinassay/contract';
import { resolveMethod } from '../../documents/resolve-method.ts';
import { storeDocument } from '../../documents/store-document.ts';
import type { Handler } from '../../http/answer.ts';
import { authorise } from '../../http/authorise.ts';
import { parseJson } from '../../http/parse-json.ts';
import { parseWith } from '../../http/parse-with.ts';
import { readBody } from '../../http/read-body.ts';

/** `POST /v1/methods`: version 1 of a method, or its next version, with every compound version fixed. */
export const createMethod: Handler = async (request, dependencies) => {
  const principal = await authorise(request, operations.createMethod, dependencies);
  const received = await readBody(request, operations.createMethod);
  const { id, body } = parseWith(methodPostSchema, parseJson(received.bytes));
  return dependencies.store.withLaboratory(principal.laboratoryId, async (transaction) =>
    storeDocument(transaction, { kind: 'method', id, name: body.name, body: await resolveMethod(transaction, body) }),
  );
};
