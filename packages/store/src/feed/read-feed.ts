import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';

/** One event of a laboratory's feed. */
export type FeedRow = {
  /** 1, 2, 3, ... without gaps. */
  readonly sequence: number;
  readonly kind: 'result';
  readonly fitId: string;
  readonly acquisitionId: string;
  readonly methodId: string;
  readonly methodVersion: number;
  readonly resultSha256: string;
  readonly recommendation: 'releasable' | 'held';
  /** Database clock, just before the commit. */
  readonly committedAt: string;
};

type EventRow = Omit<FeedRow, 'sequence' | 'committedAt'> & { sequence: string; committed_at: Date };

/** At most `limit` events after a sequence number (0: from the start). What was read never changes and nothing appears before it. */
export async function readFeed(
  transaction: LaboratoryTransaction,
  { after, limit }: { readonly after: number; readonly limit: number },
): Promise<FeedRow[]> {
  const rows = await transaction[sqlDoor].query<EventRow>(
    `select sequence, kind, event.fit_id as "fitId", acquisition_id as "acquisitionId", method_id as "methodId",
      method_version as "methodVersion", result.sha256 as "resultSha256", recommendation, committed_at
    from feed_event event
    join fit on fit.laboratory_id = event.laboratory_id and fit.id = event.fit_id
    join result on result.laboratory_id = event.laboratory_id and result.fit_id = event.fit_id
    where event.laboratory_id = $1 and sequence > $2 order by sequence limit $3`,
    [transaction.laboratoryId, after, limit],
  );
  return rows.map(({ sequence, committed_at, ...event }) => ({
    ...event,
    sequence: Number(sequence),
    committedAt: committed_at.toISOString(),
  }));
}
