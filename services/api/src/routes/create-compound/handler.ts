import { compoundPostSchema, operations } from '@spinassay/contract';
import { storeDocument } from '../../documents/store-document.ts';
import type { Handler } from '../../http/answer.ts';
import { authorise } from '../../http/authorise.ts';
import { parseJson } from '../../http/parse-json.ts';
import { parseWith } from '../../http/parse-with.ts';
import { readBody } from '../../http/read-body.ts';

/** `POST /v1/compounds`: version 1 of a compound, or its next version. */
export const createCompound: Handler = async (request, dependencies) => {
  const principal = await authorise(request, operations.createCompound, dependencies);
  const received = await readBody(request, operations.createCompound);
  const { id, body } = parseWith(compoundPostSchema, parseJson(received.bytes));
  return dependencies.store.withLaboratory(principal.laboratoryId, (transaction) =>
    storeDocument(transaction, { kind: 'compound', id, name: body.name, body }),
  );
};
