import { ProblemError, type ProblemRecord } from '@spinassay/problems';
import { BlobDamagedError, isStoreUnavailable } from '@spinassay/store';

/** A failure as it is told: the problem, and the headers that go with it. */
export type Failure = { readonly record: ProblemRecord; readonly headers: Readonly<Record<string, string>> };

/** Seconds after which a client may try again: longer than a restart of the database takes. */
const RETRY_AFTER_SECONDS = 5;

/**
 * The one place where failures become answers: known problems as they are, a database that is away as 503,
 * and everything else as our own fault without inner detail.
 */
export function translateFailure(error: unknown): Failure {
  if (error instanceof ProblemError) return { record: error.record, headers: headersOf(error) };
  if (isStoreUnavailable(error)) {
    const record = { slug: 'service-unavailable', detail: 'The database is away for the moment.' } as const;
    return { record, headers: { 'Retry-After': String(RETRY_AFTER_SECONDS) } };
  }
  // The router could not decode the path: no item has such a name.
  if (error instanceof URIError)
    return { record: { slug: 'unknown-path', detail: 'The path is not readable.' }, headers: {} };
  const detail =
    error instanceof BlobDamagedError
      ? 'Stored bytes no longer match their digest. Nothing is handed out.'
      : 'The service failed by its own fault; the log holds the rest under this instance.';
  return { record: { slug: 'internal-fault', detail }, headers: {} };
}

function headersOf({ record }: ProblemError): Record<string, string> {
  if (record.slug === 'key-missing') return { 'WWW-Authenticate': 'Bearer realm="spinassay"' };
  if (record.slug === 'key-unknown') return { 'WWW-Authenticate': 'Bearer realm="spinassay", error="invalid_token"' };
  if (record.slug === 'service-unavailable') return { 'Retry-After': String(RETRY_AFTER_SECONDS) };
  return {};
}
