import type { Acquisition, Conditions } from '@spinassay/contract';
import type { StoredAcquisition } from '@spinassay/store';

/** A stored acquisition as the contract shows it. */
export function acquisitionOnWire(stored: StoredAcquisition): Acquisition {
  const { conditions, title } = stored;
  return {
    id: stored.id,
    signalSha256: stored.signalSha256,
    conditionsVersion: conditions.version,
    conditionsSha256: conditions.sha256,
    conditions: JSON.parse(conditions.effectiveText) as Conditions,
    declaredConditions: JSON.parse(conditions.declaredText) as Conditions,
    fileConditions: JSON.parse(conditions.fileText) as Conditions,
    ...(title === undefined ? {} : { title }),
    sampleCount: stored.sampleCount,
    dwellSeconds: stored.dwellSeconds,
    observeFrequencyMHz: stored.observeFrequencyMHz,
    nucleus: stored.nucleus,
    original: stored.original,
    receivedAt: stored.receivedAt,
  };
}

/** The path of an acquisition. */
export function acquisitionPath(id: string): string {
  return `/v1/acquisitions/${id}`;
}
