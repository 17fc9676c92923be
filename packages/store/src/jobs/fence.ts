import type { JobState } from '../fits/stored-fit.ts';
import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';

/** The right to finish a job: it ends when the job is handed to another attempt. */
export type Fence = { readonly jobId: string; readonly attempt: number; readonly laboratoryId: string };

/** The job is no longer this attempt's: another has it, or it is final. Whatever was being written is rolled back. */
export class FencedError extends Error {
  override readonly name = 'FencedError';
  readonly fence: Fence;

  constructor(fence: Fence) {
    super(`job ${fence.jobId} is no longer held by attempt ${fence.attempt}`);
    this.fence = fence;
  }
}

export type JobEnding = {
  readonly state: Exclude<JobState, 'running'>;
  readonly outcome: 'completed' | 'failed' | 'cancelled' | 'handed-back';
  readonly problem?: string;
  readonly timings?: Readonly<Record<string, number>>;
  readonly delaySeconds?: number;
  readonly isForgiven?: boolean;
};

/**
 * Take a running job out of an attempt's hands into another state, and close the attempt.
 *
 * The first statement of every finish: 0 rows means that the fence has fallen, and the throw rolls back all the rest.
 *
 * @throws FencedError
 */
export async function endAttempt(transaction: LaboratoryTransaction, fence: Fence, ending: JobEnding): Promise<void> {
  const sql = transaction[sqlDoor];
  const ended = await sql.query(
    `update job set state = $4, worker_id = null, lease_until = null, stage = null, fraction = null, dispatched_at = null,
      problem = $5,
      finished_at = case when $4 <> 'queued' then clock_timestamp() end,
      not_before = case when $6 > 0 then clock_timestamp() + make_interval(secs => $6) else not_before end,
      forgiven_count = forgiven_count + $7
    where laboratory_id = $1 and id = $2 and attempt = $3 and state = 'running'
      and ($4 <> 'cancelled' or cancel_requested) returning id`,
    [
      fence.laboratoryId,
      fence.jobId,
      fence.attempt,
      ending.state,
      ending.problem ?? null,
      ending.delaySeconds ?? 0,
      ending.isForgiven ? 1 : 0,
    ],
  );
  if (ended.length === 0) throw new FencedError(fence);
  await sql.query(
    `update job_attempt set ended_at = clock_timestamp(), outcome = $4, timings = $5
    where laboratory_id = $1 and job_id = $2 and attempt = $3`,
    [fence.laboratoryId, fence.jobId, fence.attempt, ending.outcome, JSON.stringify(ending.timings ?? {})],
  );
  sql.notices.push({ topic: 'fit', id: fence.jobId });
}
