import { setTimeout as pause } from 'node:timers/promises';

/** serialization_failure and deadlock_detected (PostgreSQL appendix A): the server asks for the transaction to be run again. */
const conflictCodes = new Set(['40001', '40P01']);
const retryCountMax = 3;
/** Spread of the wait before another try, so that two that met do not meet again. */
const pauseMillisecondsMax = 20;

/** Run a transaction, and again when it met another one, up to three more times. */
export async function retryConflicts<T>(transaction: () => Promise<T>): Promise<T> {
  for (let retryCount = 0; ; retryCount += 1) {
    try {
      return await transaction();
    } catch (error) {
      if (!isConflict(error) || retryCount === retryCountMax) throw error;
      await pause(Math.random() * pauseMillisecondsMax);
    }
  }
}

function isConflict(error: unknown): boolean {
  return error instanceof Error && conflictCodes.has(String(Reflect.get(error, 'code')));
}
