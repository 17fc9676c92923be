import { type Conditions, canonicalJson, operations, sha256Hex, signalDigest } from '@spinassay/contract';
import { ProblemError } from '@spinassay/problems';
import { createAcquisition as insertAcquisition } from '@spinassay/store';
import { acquisitionOnWire, acquisitionPath } from '../../acquisitions/acquisition-on-wire.ts';
import { conditionDifferences } from '../../acquisitions/condition-differences.ts';
import { conditionsInForce } from '../../acquisitions/conditions-in-force.ts';
import { readPostedAcquisition } from '../../acquisitions/read-posted-acquisition.ts';
import { sampleBytes } from '../../acquisitions/sample-bytes.ts';
import type { Handler } from '../../http/answer.ts';
import { authorise } from '../../http/authorise.ts';
import { readBody } from '../../http/read-body.ts';

/** `POST /v1/acquisitions`: store a signal once, under one description. */
export const createAcquisition: Handler = async (request, dependencies) => {
  const principal = await authorise(request, operations.createAcquisition, dependencies);
  const original = await readBody(request, operations.createAcquisition);
  const { acquisition, declared, fromFile } = readPostedAcquisition(original);
  const { title, sampleCount, dwellSeconds, observeFrequencyMHz, nucleus, samples } = acquisition;
  const bytes = sampleBytes(samples);
  const inForce = conditionsInForce(declared, fromFile);
  const effectiveText = canonicalJson(inForce);
  const { outcome, acquisition: stored } = await dependencies.store.withLaboratory(
    principal.laboratoryId,
    (transaction) =>
      insertAcquisition(transaction, {
        signal: {
          bytes,
          sha256: signalDigest(acquisition, bytes),
          sampleCount,
          dwellSeconds,
          observeFrequencyMHz,
          nucleus,
        },
        original,
        ...(title === undefined ? {} : { title }),
        conditions: {
          effectiveText,
          declaredText: canonicalJson(declared),
          fileText: canonicalJson(fromFile),
          sha256: sha256Hex(effectiveText),
        },
      }),
  );
  if (outcome === 'known') refuseOtherConditions(stored.id, JSON.parse(stored.conditions.effectiveText), inForce);
  return {
    status: outcome === 'created' ? 201 : 200,
    headers: { Location: acquisitionPath(stored.id) },
    json: acquisitionOnWire(stored),
  };
};

/** A later issue stores corrected conditions as a new version; until then the same signal has one description. */
function refuseOtherConditions(id: string, held: Conditions, sent: Conditions): void {
  const errors = conditionDifferences(held, sent);
  if (errors.length === 0) return;
  const detail = `This signal is held as ${acquisitionPath(id)} with other conditions.`;
  throw new ProblemError({ slug: 'conditions-differ', detail, errors, facts: { acquisitionId: id } });
}
