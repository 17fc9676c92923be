import { lookUpAcquisition } from '../acquisitions/find-acquisition.ts';
import { readSignalSamples } from '../acquisitions/read-signal-samples.ts';
import type { StoredAcquisition } from '../acquisitions/stored-acquisition.ts';
import { findDocument } from '../documents/find-document.ts';
import type { StoredDocument } from '../documents/stored-document.ts';
import { UnknownRowError } from '../one-row.ts';
import type { LaboratoryTransaction } from '../sql-door.ts';
import { findFit } from './find-fit.ts';
import type { StoredFit } from './stored-fit.ts';

/** All that a fit refers to, at the versions it refers to. Compounds are named inside the method. */
export type FitInputs = {
  readonly fit: StoredFit;
  /** With the conditions of the fit's version. */
  readonly acquisition: StoredAcquisition;
  readonly method: StoredDocument;
  readonly preparation?: StoredDocument;
  /** (2 x sampleCount) interleaved re, im. */
  readonly samples: Float64Array;
};

/**
 * Load what a fit needs.
 *
 * @throws UnknownRowError when the laboratory has no such fit
 * @throws BlobDamagedError when the samples have changed since they were taken in
 */
export async function loadFitInputs(transaction: LaboratoryTransaction, fitId: string): Promise<FitInputs> {
  const fit = held(await findFit(transaction, fitId), 'fit');
  const { acquisitionId, conditionsVersion, methodId, methodVersion, preparationId, preparationVersion } = fit;
  const acquisition = held(
    await lookUpAcquisition(transaction, { id: acquisitionId, conditionsVersion }),
    'acquisition',
  );
  const method = held(
    await findDocument(transaction, { kind: 'method', id: methodId, version: methodVersion }),
    'method',
  );
  const samples = held(await readSignalSamples(transaction, acquisitionId), 'signal');
  if (preparationId === undefined || preparationVersion === undefined) return { fit, acquisition, method, samples };
  const address = { kind: 'preparation', id: preparationId, version: preparationVersion } as const;
  const preparation = held(await findDocument(transaction, address), 'preparation');
  return { fit, acquisition, method, preparation, samples };
}

/** Foreign keys hold what a fit refers to; only the fit itself can be missing. */
function held<T>(value: T | undefined, sought: string): T {
  if (value === undefined) throw new UnknownRowError(`expected one ${sought}, got none`);
  return value;
}
