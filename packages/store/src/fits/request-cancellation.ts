import { writeAudit } from '../audit/write-audit.ts';
import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';
import type { JobState } from './stored-fit.ts';

/** `cancelled`: it had not begun. `requested`: its worker was told. `already-final`: too late. */
export type CancellationOutcome = 'cancelled' | 'requested' | 'already-final';

/** Ask that a fit be given up; undefined when the laboratory has no such fit. */
export async function requestCancellation(
  transaction: LaboratoryTransaction,
  fitId: string,
): Promise<CancellationOutcome | undefined> {
  const { laboratoryId, [sqlDoor]: sql } = transaction;
  // The row stays locked until the commit, so no worker takes it up between this look and the change.
  const [held] = await sql.query<{ state: JobState }>(
    `select state from job where laboratory_id = $1 and id = $2 and kind = 'fit' for update`,
    [laboratoryId, fitId],
  );
  if (held === undefined) return undefined;
  if (held.state !== 'queued' && held.state !== 'running') return 'already-final';
  await sql.query(
    `update job set cancel_requested = true,
      state = case state when 'queued' then 'cancelled' else state end,
      finished_at = case state when 'queued' then clock_timestamp() end
    where laboratory_id = $1 and id = $2`,
    [laboratoryId, fitId],
  );
  await writeAudit(sql, { laboratoryId, action: 'fit-cancellation-requested', subject: fitId });
  sql.notices.push({ topic: 'fit', id: fitId }, { topic: 'cancel', id: fitId });
  return held.state === 'queued' ? 'cancelled' : 'requested';
}
