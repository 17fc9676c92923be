import { type Store, sqlDoor } from '../sql-door.ts';
import type { Fence } from './fence.ts';

export type LeaseNews = {
  readonly leaseSeconds: number;
  /** What the work is at; absent leaves it as it was. */
  readonly stage?: string;
  /** 0 to 1. */
  readonly fraction?: number;
};

/** `held`: go on. `cancel-requested`: stop, then record it. `fenced`: stop, another has the job. */
export type LeaseState = 'held' | 'cancel-requested' | 'fenced';

/** Keep a job for another while, tell how far it is, and hear whether it is still wanted. */
export async function renewLease(
  store: Store,
  fence: Fence,
  { leaseSeconds, stage, fraction }: LeaseNews,
): Promise<LeaseState> {
  const [row] = await store[sqlDoor].query<{ cancel_requested: boolean }>(
    `update job set lease_until = clock_timestamp() + make_interval(secs => $4),
      stage = coalesce($5, stage), fraction = coalesce($6, fraction)
    where laboratory_id = $1 and id = $2 and attempt = $3 and state = 'running'
    returning cancel_requested`,
    [fence.laboratoryId, fence.jobId, fence.attempt, leaseSeconds, stage ?? null, fraction ?? null],
  );
  if (row === undefined) return 'fenced';
  if (stage !== undefined || fraction !== undefined) await store[sqlDoor].notify([{ topic: 'fit', id: fence.jobId }]);
  return row.cancel_requested ? 'cancel-requested' : 'held';
}
