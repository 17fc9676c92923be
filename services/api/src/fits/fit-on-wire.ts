import type { Fit } from '@spinassay/contract';
import { problemDocument } from '@spinassay/problems';
import type { StoredFit } from '@spinassay/store';

/** A stored fit as the contract shows it; a stored problem is addressed to whoever reads it now. */
export function fitOnWire(fit: StoredFit, baseUrl: string): Fit {
  const problem = fit.problem && problemDocument(fit.problem, { baseUrl, instance: fitPath(fit.id) });
  return {
    id: fit.id,
    status: fit.state,
    ...present('stage', fit.stage),
    ...present('fraction', fit.fraction),
    attempt: fit.attempt,
    acquisitionId: fit.acquisitionId,
    conditionsVersion: fit.conditionsVersion,
    methodId: fit.methodId,
    methodVersion: fit.methodVersion,
    ...present('preparationId', fit.preparationId),
    ...present('preparationVersion', fit.preparationVersion),
    options: JSON.parse(fit.optionsText) as Fit['options'],
    ...present('repeatReason', fit.repeatReason),
    inputSha256: fit.inputSha256,
    seed: fit.seed,
    ...present('resultSha256', fit.resultSha256),
    ...(problem === undefined ? {} : { problem: problem as unknown as NonNullable<Fit['problem']> }),
    createdAt: fit.createdAt,
    ...present('finishedAt', fit.finishedAt),
  };
}

/** The path of a fit. */
export function fitPath(id: string): string {
  return `/v1/fits/${id}`;
}

function present<K extends string, V>(key: K, value: V | undefined): { [P in K]?: V } {
  return value === undefined ? {} : ({ [key]: value } as { [P in K]: V });
}
