/** Sequences are bigint counters of the database, held in a double: exact to 2^53. */
const cursorForm = /^feed:(\d{1,15})$/;

/** An opaque cursor behind the event of this sequence; 0 is the beginning. */
export function writeFeedCursor(sequence: number): string {
  return Buffer.from(`feed:${sequence}`, 'utf8').toString('base64url');
}

/** The sequence of a cursor that this service gave, undefined for any other text. */
export function readFeedCursor(cursor: string): number | undefined {
  const digits = cursorForm.exec(Buffer.from(cursor, 'base64url').toString('utf8'))?.[1];
  if (digits === undefined) return undefined;
  const sequence = Number(digits);
  // Base64 decoding forgives: only the exact text that was given counts.
  return writeFeedCursor(sequence) === cursor ? sequence : undefined;
}
