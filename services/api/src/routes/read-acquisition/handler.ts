import { operations } from '@spinassay/contract';
import { findAcquisition } from '@spinassay/store';
import { acquisitionOnWire } from '../../acquisitions/acquisition-on-wire.ts';
import { findOrRefuse } from '../../acquisitions/find-or-refuse.ts';
import type { Handler } from '../../http/answer.ts';
import { authorise } from '../../http/authorise.ts';

/** `GET /v1/acquisitions/{id}`: what is stored of an acquisition, without its samples. */
export const readAcquisition: Handler = async (request, dependencies) => {
  const principal = await authorise(request, operations.readAcquisition, dependencies);
  const stored = await findOrRefuse(String(request.params['id']), (id) =>
    dependencies.store.withLaboratory(principal.laboratoryId, (transaction) => findAcquisition(transaction, id)),
  );
  return { status: 200, json: acquisitionOnWire(stored) };
};
