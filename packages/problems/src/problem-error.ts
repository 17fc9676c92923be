import { problemCatalogue } from './catalogue.ts';
import type { ProblemRecord } from './problem-record.ts';

/**
 * A failure that a client may see, thrown where it is decided and answered in one place per service.
 *
 * Not for our own bugs: those are thrown as ordinary errors and reach the client as `internal-fault`.
 */
export class ProblemError extends Error {
  override readonly name = 'ProblemError';
  readonly record: ProblemRecord;

  constructor(record: ProblemRecord, options?: { readonly cause?: unknown }) {
    super(`${record.slug}: ${record.detail}`, options);
    this.record = record;
  }

  /** HTTP status of the answer. */
  get status(): number {
    return problemCatalogue[this.record.slug].status;
  }

  /** True when the same request may succeed later without being changed. */
  get isRetryable(): boolean {
    return problemCatalogue[this.record.slug].retryable;
  }
}
