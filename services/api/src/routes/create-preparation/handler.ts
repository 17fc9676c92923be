import { operations, preparationPostSchema } from '@spinassay/contract';
import { ProblemError } from '@spinassay/problems';
import { findDocument } from '@spinassay/store';
import { storeDocument } from '../../documents/store-document.ts';
import type { Handler } from '../../http/answer.ts';
import { authorise } from '../../http/authorise.ts';
import { parseJson } from '../../http/parse-json.ts';
import { parseWith } from '../../http/parse-with.ts';
import { readBody } from '../../http/read-body.ts';

/** `POST /v1/preparations`: version 1 of a preparation, or its next version. */
export const createPreparation: Handler = async (request, dependencies) => {
  const principal = await authorise(request, operations.createPreparation, dependencies);
  const received = await readBody(request, operations.createPreparation);
  const { id, body } = parseWith(preparationPostSchema, parseJson(received.bytes));
  const { compoundId } = body.standard;
  return dependencies.store.withLaboratory(principal.laboratoryId, async (transaction) => {
    if ((await findDocument(transaction, { kind: 'compound', id: compoundId })) === undefined) {
      const errors = [{ pointer: '#/body/standard/compoundId', detail: `there is no compound "${compoundId}"` }];
      throw new ProblemError({ slug: 'unknown-reference', detail: 'The standard is not in the catalogue.', errors });
    }
    return storeDocument(transaction, { kind: 'preparation', id, name: body.label ?? id, body });
  });
};
