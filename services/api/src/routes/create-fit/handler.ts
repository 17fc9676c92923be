import { fitPostSchema, operations } from '@spinassay/contract';
import { createFit as insertFit, markDispatched } from '@spinassay/store';
import type { ApiDependencies } from '../../api-dependencies.ts';
import { fitDigests } from '../../fits/fit-digests.ts';
import { fitOnWire, fitPath } from '../../fits/fit-on-wire.ts';
import { resolveFit } from '../../fits/resolve-fit.ts';
import type { Handler } from '../../http/answer.ts';
import { authorise } from '../../http/authorise.ts';
import { parseJson } from '../../http/parse-json.ts';
import { parseWith } from '../../http/parse-with.ts';
import { readBody } from '../../http/read-body.ts';

/** `POST /v1/fits`: ask for a fit; asking twice is asking once. */
export const createFit: Handler = async (request, dependencies) => {
  const { laboratoryId } = await authorise(request, operations.createFit, dependencies);
  const received = await readBody(request, operations.createFit);
  const post = parseWith(fitPostSchema, parseJson(received.bytes));
  const { outcome, fit } = await dependencies.store.withLaboratory(laboratoryId, async (transaction) => {
    const references = await resolveFit(transaction, post);
    const { acquisition, method, preparation, optionsText } = references;
    return insertFit(transaction, {
      ...fitDigests(references, post.repeatReason),
      acquisitionId: acquisition.id,
      conditionsVersion: acquisition.conditions.version,
      methodId: method.id,
      methodVersion: method.version,
      ...(preparation === undefined ? {} : { preparationId: preparation.id, preparationVersion: preparation.version }),
      optionsText,
      ...(post.repeatReason === undefined ? {} : { repeatReason: post.repeatReason }),
    });
  });
  if (outcome === 'created') await ring(dependencies, laboratoryId, fit.id);
  return {
    status: outcome === 'created' ? 202 : 200,
    headers: { Location: fitPath(fit.id) },
    json: fitOnWire(fit, dependencies.baseUrl()),
  };
};

/** The fit is committed: a bell that does not ring costs time, not work, since the sweep rings again. */
async function ring({ store, bell, logger }: ApiDependencies, laboratoryId: string, fitId: string): Promise<void> {
  try {
    await bell.ring();
    await store.withLaboratory(laboratoryId, (transaction) => markDispatched(transaction, fitId));
  } catch (error) {
    logger.warn({ fitId, err: error }, 'ring-failed');
  }
}
