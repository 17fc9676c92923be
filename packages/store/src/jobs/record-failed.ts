import type { ProblemRecord } from '@spinassay/problems';
import { writeAudit } from '../audit/write-audit.ts';
import { type Store, sqlDoor } from '../sql-door.ts';
import { endAttempt, type Fence } from './fence.ts';

export type FailedFit = { readonly problem: ProblemRecord; readonly timings?: Readonly<Record<string, number>> };

/**
 * Record that a job failed for good, with the problem that its reader will see.
 *
 * @throws FencedError when the job is no longer this attempt's; nothing was written
 */
export async function recordFailed(store: Store, fence: Fence, { problem, timings = {} }: FailedFit): Promise<void> {
  const { laboratoryId, jobId } = fence;
  await store.withLaboratory(laboratoryId, async (transaction) => {
    const ending = { state: 'failed', outcome: 'failed', problem: JSON.stringify(problem), timings } as const;
    await endAttempt(transaction, fence, ending);
    const detail = { attempt: fence.attempt, problem: problem.slug };
    await writeAudit(transaction[sqlDoor], { laboratoryId, action: 'fit-failed', subject: jobId, detail });
  });
}
