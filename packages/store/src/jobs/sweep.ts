import type { ProblemRecord } from '@spinassay/problems';
import { advisoryClass } from '../connection-settings.ts';
import type { JobState } from '../fits/stored-fit.ts';
import { type Sql, type Store, sqlDoor } from '../sql-door.ts';

export type SweepReport = {
  /** Jobs taken from dead or silent workers and queued again. */
  readonly handedBackCount: number;
  /** Jobs that lost their last attempt. */
  readonly failedCount: number;
  /** Jobs that are due and for which nobody was woken, or long ago: ring the bell so many times. */
  readonly waitingCount: number;
};

/** A ring that was answered by nobody for so long is taken for lost. */
const overdueSeconds = 10;
/** Rows one sweep wakes for; the next sweep goes on. */
const waitingCountMax = 1_000;

const exhausted: ProblemRecord = {
  slug: 'attempts-exhausted',
  detail: 'Every attempt lost its worker before it could finish, so the job may be what ends them. Report this fit.',
};

/**
 * Find what was left lying: jobs of workers that are gone, leases that ran out, and jobs for which no bell was heard.
 *
 * A worker holds a session advisory lock for as long as it lives, and the server frees it within milliseconds of a kill; the lease is only
 * for workers that hang. Any number of sweeps may run at once.
 */
export async function sweep(store: Store): Promise<SweepReport> {
  return store[sqlDoor].transaction(async (sql) => {
    const lost = await takeFromTheLost(sql, await findDeadWorkers(sql));
    for (const { id } of lost) sql.notices.push({ topic: 'fit', id });
    return {
      handedBackCount: lost.filter(({ state }) => state === 'queued').length,
      failedCount: lost.filter(({ state }) => state === 'failed').length,
      waitingCount: await markWaiting(sql),
    };
  });
}

/** Whoever can take a worker's lock knows that the worker is dead. It took the lock before its first claim, so there is no earlier moment. */
async function findDeadWorkers(sql: Sql): Promise<string[]> {
  const rows = await sql.query<{ id: string }>(
    `with holders as materialized (
      select worker.id, advisory_key from worker
      where exists (select from job where job.worker_id = worker.id and job.state = 'running')
    )
    select id from holders where pg_try_advisory_xact_lock($1, advisory_key)`,
    [advisoryClass.worker],
  );
  return rows.map(({ id }) => id);
}

/** A lost job whose cancellation was asked for is cancelled; one over its maximum fails; any other keeps its place in the queue. */
function takeFromTheLost(sql: Sql, deadWorkerIds: readonly string[]): Promise<{ id: string; state: JobState }[]> {
  return sql.query<{ id: string; state: JobState }>(
    `with lost as materialized (
      select id, case
        when cancel_requested then 'cancelled'
        when attempt - forgiven_count >= max_attempts then 'failed'
        else 'queued' end as next_state
      from job where state = 'running' and (worker_id = any($1) or lease_until < clock_timestamp())
      for update skip locked
    ), taken as (
      update job set state = next_state, worker_id = null, lease_until = null, stage = null, fraction = null,
        dispatched_at = null,
        problem = case next_state when 'failed' then $2 end,
        finished_at = case when next_state <> 'queued' then clock_timestamp() end
      from lost where job.id = lost.id
      returning job.laboratory_id, job.id, job.attempt, job.state
    ), closed as (
      update job_attempt set ended_at = clock_timestamp(), outcome = 'lost' from taken
      where job_attempt.laboratory_id = taken.laboratory_id and job_attempt.job_id = taken.id
        and job_attempt.attempt = taken.attempt
    ), noted as (
      insert into audit (laboratory_id, action, subject, detail)
      select laboratory_id, 'fit-attempt-lost', id::text, json_build_object('attempt', attempt, 'state', state)::text from taken
    )
    select id, state from taken`,
    [deadWorkerIds, JSON.stringify(exhausted)],
  );
}

async function markWaiting(sql: Sql): Promise<number> {
  const rows = await sql.query(
    `with waiting as materialized (
      select id from job
      where state = 'queued' and not_before <= clock_timestamp()
        and (dispatched_at is null or dispatched_at < clock_timestamp() - make_interval(secs => $1))
      order by not_before, id limit $2 for update skip locked
    )
    update job set dispatched_at = clock_timestamp() from waiting where job.id = waiting.id returning job.id`,
    [overdueSeconds, waitingCountMax],
  );
  return rows.length;
}
