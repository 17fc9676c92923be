import { writeAudit } from '../audit/write-audit.ts';
import { appendFeedEvent } from '../feed/append-feed-event.ts';
import { type Store, sqlDoor } from '../sql-door.ts';
import { endAttempt, type Fence } from './fence.ts';

export type CompletedFit = {
  /** Canonical JSON; `resultSha256` is over it, which the database checks. */
  readonly resultText: string;
  readonly resultSha256: string;
  readonly engineVersion: string;
  readonly numericsId: string;
  readonly recommendation: 'releasable' | 'held';
  /** Seconds by name; they belong to the attempt, not to the result. */
  readonly timings?: Readonly<Record<string, number>>;
};

/**
 * Record a result: state, result, audit and feed event in one transaction, the feed's head locked last.
 *
 * @throws FencedError when the job is no longer this attempt's; nothing was written
 */
export async function recordCompleted(store: Store, fence: Fence, fit: CompletedFit): Promise<void> {
  const { laboratoryId, jobId } = fence;
  await store.withLaboratory(laboratoryId, async (transaction) => {
    const { timings = {} } = fit;
    await endAttempt(transaction, fence, { state: 'completed', outcome: 'completed', timings });
    const sql = transaction[sqlDoor];
    await sql.query(
      `insert into result (laboratory_id, fit_id, result_text, sha256, engine_version, numerics_id, recommendation)
      values ($1, $2, $3, $4, $5, $6, $7)`,
      [laboratoryId, jobId, fit.resultText, fit.resultSha256, fit.engineVersion, fit.numericsId, fit.recommendation],
    );
    const detail = { attempt: fence.attempt, resultSha256: fit.resultSha256 };
    await writeAudit(sql, { laboratoryId, action: 'fit-completed', subject: jobId, detail });
    await appendFeedEvent(transaction, { kind: 'result', fitId: jobId });
  });
}
