/** A row that the store expected is not there: a broken promise between caller and store, not an answer to a question. */
export class UnknownRowError extends Error {
  override readonly name = 'UnknownRowError';
}

/**
 * The single row of a statement that always gives one.
 *
 * @throws UnknownRowError naming what was looked for
 */
export function oneRow<Row>(rows: readonly Row[], sought: string): Row {
  const row = rows[0];
  if (row === undefined || rows.length !== 1) throw new UnknownRowError(`expected one ${sought}, got ${rows.length}`);
  return row;
}
