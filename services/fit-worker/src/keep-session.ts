import { setTimeout as pause } from 'node:timers/promises';
import type { WorkerSession } from '@spinassay/store';

export type SessionOptions = {
  open(): Promise<WorkerSession>;
  /** Called with every session that was opened. */
  onOpened(session: WorkerSession): void;
  /** Told of sessions that were lost or could not be opened; another is tried for. */
  onTrouble(error: unknown): void;
};

export type KeptSession = {
  /** undefined while the database is away: then nothing may be claimed, because nobody would see that we are alive. */
  current(): WorkerSession | undefined;
  close(): Promise<void>;
};

const reopenMilliseconds = 500;

/** Have a worker session for as long as the database lets us, and another one after each loss. */
export function keepSession(options: SessionOptions): KeptSession {
  const closing = new AbortController();
  const closed = new Promise<undefined>((resolve) => {
    closing.signal.addEventListener('abort', () => resolve(undefined), { once: true });
  });
  let current: WorkerSession | undefined;

  const useOne = async (): Promise<void> => {
    const session = await options.open();
    try {
      current = session;
      options.onOpened(session);
      const loss = await Promise.race([session.lost, closed]);
      if (loss !== undefined) options.onTrouble(loss);
    } finally {
      current = undefined;
      await session.close();
    }
  };
  const running = (async () => {
    while (!closing.signal.aborted) {
      await useOne().catch(options.onTrouble);
      // An abort ends the pause early, and the loop with it.
      await pause(reopenMilliseconds, undefined, { signal: closing.signal }).catch(() => {});
    }
  })();
  return {
    current: () => current,
    close: () => {
      closing.abort();
      return running;
    },
  };
}
