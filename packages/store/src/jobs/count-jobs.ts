import { oneRow } from '../one-row.ts';
import { type Store, sqlDoor } from '../sql-door.ts';

export type JobCounts = {
  readonly queued: number;
  readonly running: number;
  /** Age of the job that is due and has waited longest; absent when none waits. Liveness is this, not 'process up'. */
  readonly oldestQueuedSeconds?: number;
};

/** How much work waits and is under way, over all laboratories. The queue behind the bell cannot tell: it carries no work. */
export async function countJobs(store: Store): Promise<JobCounts> {
  const rows = await store[sqlDoor].query<{ queued: number; running: number; oldest: number | null }>(
    `select count(*) filter (where state = 'queued')::integer as queued,
      count(*) filter (where state = 'running')::integer as running,
      max(extract(epoch from clock_timestamp() - not_before))
        filter (where state = 'queued' and not_before <= clock_timestamp())::double precision as oldest
    from job where state in ('queued', 'running')`,
  );
  const { queued, running, oldest } = oneRow(rows, 'count of jobs');
  return { queued, running, ...(oldest === null ? {} : { oldestQueuedSeconds: oldest }) };
}
