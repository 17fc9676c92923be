import { type Store, sqlDoor } from '../sql-door.ts';
import type { Fence } from './fence.ts';

export type JobKind = 'fit';

export type ClaimOrder = {
  readonly workerId: string;
  readonly kinds: readonly JobKind[];
  /** Time until the job may be given to another, unless the lease is renewed. Database clock. */
  readonly leaseSeconds: number;
};

export type ClaimedJob = { readonly fence: Fence; readonly kind: JobKind };

type ClaimedRow = { id: string; attempt: number; laboratory_id: string; kind: JobKind };

/**
 * Take up the job that has waited longest, or undefined when none is due.
 *
 * One statement under READ COMMITTED. `skip locked` lets concurrent claimers pass each other, and the materialised query makes sure that
 * exactly one row is locked: inlined, the planner may run it again for every row of the update.
 */
export async function claimNext(
  store: Store,
  { workerId, kinds, leaseSeconds }: ClaimOrder,
): Promise<ClaimedJob | undefined> {
  const [row] = await store[sqlDoor].query<ClaimedRow>(
    `with due as materialized (
      select id from job
      where state = 'queued' and kind = any($1) and not_before <= clock_timestamp()
      order by not_before, id limit 1 for update skip locked
    ), claimed as (
      update job set state = 'running', attempt = attempt + 1, worker_id = $2,
        lease_until = clock_timestamp() + make_interval(secs => $3)
      from due where job.id = due.id
      returning job.id, job.attempt, job.laboratory_id, job.kind
    ), opened as (
      insert into job_attempt (laboratory_id, job_id, attempt, worker_id) select laboratory_id, id, attempt, $2 from claimed
    )
    select id, attempt, laboratory_id, kind from claimed`,
    [kinds, workerId, leaseSeconds],
  );
  if (row === undefined) return undefined;
  await store[sqlDoor].notify([{ topic: 'fit', id: row.id }]);
  return { fence: { jobId: row.id, attempt: row.attempt, laboratoryId: row.laboratory_id }, kind: row.kind };
}
