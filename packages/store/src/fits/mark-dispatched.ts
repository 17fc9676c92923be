import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';

/** Note that the bell was rung for a fit. The sweep rings for what was never marked, or marked long ago and still waits. */
export async function markDispatched(transaction: LaboratoryTransaction, fitId: string): Promise<void> {
  await transaction[sqlDoor].query(
    `update job set dispatched_at = clock_timestamp() where laboratory_id = $1 and id = $2 and state = 'queued'`,
    [transaction.laboratoryId, fitId],
  );
}
