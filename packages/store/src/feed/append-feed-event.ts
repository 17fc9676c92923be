import { oneRow } from '../one-row.ts';
import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';

/**
 * Put an event at the end of the laboratory's feed. Call it last: from here to the commit every other writer of this laboratory
 * waits, which is what makes sequence numbers visible in order and without gaps.
 */
export async function appendFeedEvent(
  transaction: LaboratoryTransaction,
  event: { kind: 'result'; fitId: string },
): Promise<void> {
  const { laboratoryId, [sqlDoor]: sql } = transaction;
  const rows = await sql.query<{ sequence: string }>(
    `with head as (
      update feed_head set last_sequence = last_sequence + 1 where laboratory_id = $1 returning last_sequence
    )
    insert into feed_event (laboratory_id, sequence, kind, fit_id)
    select $1, last_sequence, $2, $3 from head returning sequence`,
    [laboratoryId, event.kind, event.fitId],
  );
  oneRow(rows, `feed of laboratory ${laboratoryId}`);
  sql.notices.push({ topic: 'feed', id: laboratoryId });
}
