/** Errors of the socket that mean the server is not there. */
const socketCodes = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'ENOENT',
  'EPIPE',
  'ETIMEDOUT',
  'EHOSTUNREACH',
  'ENOTFOUND',
]);
/** PostgreSQL appendix A: shutdown, crash, not yet up, too many connections; class 08 is connection trouble. */
const serverCode = /^(57P0[123]|53300|08...)$/;
/** The driver gives these no code (pg 8.23). */
const driverMessage =
  /^(Connection terminated|timeout exceeded when trying to connect|timeout expired|Client has encountered)/;

/**
 * True when the database could not be reached or let go of us: the same call may succeed later.
 *
 * A transaction whose answer to `commit` was lost may have been committed; every write of this room may be repeated.
 */
export function isStoreUnavailable(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  const code: unknown = Reflect.get(error, 'code');
  if (typeof code === 'string') return socketCodes.has(code) || serverCode.test(code);
  return driverMessage.test(error.message);
}
