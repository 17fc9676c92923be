import { writeAudit } from '../audit/write-audit.ts';
import { type Store, sqlDoor } from '../sql-door.ts';
import { endAttempt, type Fence } from './fence.ts';

/**
 * Record that a running job was given up as asked.
 *
 * @throws FencedError when the job is no longer this attempt's, or nobody asked for its cancellation; nothing was written
 */
export async function recordCancelled(store: Store, fence: Fence): Promise<void> {
  const { laboratoryId, jobId } = fence;
  await store.withLaboratory(laboratoryId, async (transaction) => {
    await endAttempt(transaction, fence, { state: 'cancelled', outcome: 'cancelled' });
    const detail = { attempt: fence.attempt };
    await writeAudit(transaction[sqlDoor], { laboratoryId, action: 'fit-cancelled', subject: jobId, detail });
  });
}
