import { operations } from '@spinassay/contract';
import { ProblemError } from '@spinassay/problems';
import { readResult as loadResult } from '@spinassay/store';
import { findFitOrRefuse } from '../../fits/find-fit-or-refuse.ts';
import type { Handler } from '../../http/answer.ts';
import { authorise } from '../../http/authorise.ts';
import { isUnchanged } from '../../http/entity-tag.ts';

/** `GET /v1/fits/{id}/result`: the stored bytes, always the same. */
export const readResult: Handler = async (request, dependencies) => {
  const principal = await authorise(request, operations.readResult, dependencies);
  const id = String(request.params['id']);
  const { text, sha256 } = await dependencies.store.withLaboratory(principal.laboratoryId, async (transaction) => {
    const fit = await findFitOrRefuse(transaction, id);
    const result = fit.state === 'completed' ? await loadResult(transaction, id) : undefined;
    if (result === undefined) {
      const detail = `The fit is ${fit.state}.`;
      throw new ProblemError({ slug: 'fit-not-completed', detail, facts: { fitStatus: fit.state } });
    }
    return result;
  });
  // A result never changes, so a client may keep it as long as it likes.
  const headers = { ETag: `"${sha256}"`, 'Cache-Control': 'private, max-age=31536000, immutable' };
  if (isUnchanged(request, headers.ETag)) return { status: 304, headers };
  return { status: 200, headers: { ...headers, 'Content-Type': 'application/json; charset=utf-8' }, bytes: text };
};
