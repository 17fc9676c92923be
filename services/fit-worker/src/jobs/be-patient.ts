import { setTimeout as pause } from 'node:timers/promises';
import { isStoreUnavailable } from '@spinassay/store';

export type Patience = {
  /** Told of each failure that is waited out. */
  readonly onTrouble: (error: unknown) => void;
  /** Time between the first failure and giving up. */
  readonly secondsMax?: number;
};

const firstDelayMilliseconds = 100;
const delayMillisecondsMax = 5_000;

/**
 * Repeat a piece of work for as long as the database is away: minutes of numerics are not thrown away for seconds of that.
 * Delays double, each drawn between half and all of it, so that workers do not come back all at once.
 *
 * @throws whatever the work throws, once it is anything else or has lasted too long
 */
export async function bePatient<T>(work: () => Promise<T>, { onTrouble, secondsMax = 60 }: Patience): Promise<T> {
  let firstFailedAt: number | undefined;
  for (let delay = firstDelayMilliseconds; ; delay = Math.min(2 * delay, delayMillisecondsMax)) {
    try {
      return await work();
    } catch (error) {
      firstFailedAt ??= performance.now();
      const waitedSeconds = (performance.now() - firstFailedAt) / 1_000;
      if (!isStoreUnavailable(error) || waitedSeconds > secondsMax) throw error;
      onTrouble(error);
      await pause(delay * (0.5 + 0.5 * Math.random()));
    }
  }
}
