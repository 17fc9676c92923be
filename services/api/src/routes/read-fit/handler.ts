import { operations } from '@spinassay/contract';
import type { StoredFit } from '@spinassay/store';
import type { Request } from 'express';
import { findFitOrRefuse } from '../../fits/find-fit-or-refuse.ts';
import { fitOnWire } from '../../fits/fit-on-wire.ts';
import type { Handler } from '../../http/answer.ts';
import { authorise } from '../../http/authorise.ts';
import { isUnchanged } from '../../http/entity-tag.ts';
import { preferredWaitSeconds } from '../../http/preferred-wait.ts';
import { waitUntil } from '../../http/wait-until.ts';

const finalStates: readonly string[] = ['completed', 'failed', 'cancelled'];

/** `GET /v1/fits/{id}`: how far a fit is, at once or when it is final or has changed. */
export const readFit: Handler = async (request, dependencies) => {
  const { laboratoryId } = await authorise(request, operations.readFit, dependencies);
  const id = String(request.params['id']);
  const seconds = preferredWaitSeconds(request);
  const query = (): Promise<StoredFit> =>
    dependencies.store.withLaboratory(laboratoryId, (transaction) => findFitOrRefuse(transaction, id));
  const fit =
    seconds === undefined
      ? await query()
      : await waitUntil({
          seconds,
          query,
          isDone: (current) => isWorthAnswering(request, current),
          watch: (onNotice) => dependencies.notices.watch('fit', id, onNotice),
          signal: AbortSignal.any([dependencies.draining, goneSignal(request)]),
        });
  const headers = {
    ETag: entityTagOf(fit),
    'Cache-Control': 'private, no-cache',
    ...(seconds === undefined ? {} : { 'Preference-Applied': `wait=${seconds}` }),
  };
  if (isUnchanged(request, entityTagOf(fit))) return { status: 304, headers };
  return { status: 200, headers, json: fitOnWire(fit, dependencies.baseUrl()) };
};

function entityTagOf(fit: StoredFit): string {
  return `"fit-${fit.revision}"`;
}

/** Final, or news to a client that said what it knows. */
function isWorthAnswering(request: Request, fit: StoredFit): boolean {
  const isNews = request.get('if-none-match') !== undefined && !isUnchanged(request, entityTagOf(fit));
  return finalStates.includes(fit.state) || isNews;
}

/** Aborted when the client closes its connection, so that nobody waits for nobody. */
function goneSignal(request: Request): AbortSignal {
  const controller = new AbortController();
  request.res?.once('close', () => controller.abort());
  return controller.signal;
}
