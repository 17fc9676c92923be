import { operations } from '@spinassay/contract';
import { readOriginal as loadOriginal } from '@spinassay/store';
import { findOrRefuse } from '../../acquisitions/find-or-refuse.ts';
import type { Handler } from '../../http/answer.ts';
import { authorise } from '../../http/authorise.ts';

/** `GET /v1/acquisitions/{id}/original`: the bytes as they came, offered as a file so that no browser runs them. */
export const readOriginal: Handler = async (request, dependencies) => {
  const principal = await authorise(request, operations.readOriginal, dependencies);
  const original = await findOrRefuse(String(request.params['id']), (id) =>
    dependencies.store.withLaboratory(principal.laboratoryId, (transaction) => loadOriginal(transaction, id)),
  );
  const headers = {
    'Content-Type': original.mediaType,
    'Content-Disposition': 'attachment',
    ETag: `"${original.sha256}"`,
  };
  return { status: 200, headers, bytes: original.bytes };
};
