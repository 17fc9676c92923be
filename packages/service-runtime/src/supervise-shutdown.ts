import type { Logger } from './create-logger.ts';

/** What the supervision needs of a process; the running one by default. */
export type SupervisedProcess = {
  readonly ppid: number;
  on(event: string, listener: () => void): unknown;
  off(event: string, listener: () => void): unknown;
};

export type ShutdownOptions = {
  readonly logger: Pick<Logger, 'info' | 'error'>;
  /** Take nothing new, finish or hand back, close everything. */
  readonly drain: (reason: string) => Promise<void>;
  /** Ends the process; default `process.exit`. */
  readonly leave?: (exitCode: number) => void;
  readonly supervised?: SupervisedProcess;
  /** How often the parent is looked at. */
  readonly parentLookMilliseconds?: number;
};

/**
 * Leave in good order: the first reason drains and then leaves with 0, a second signal leaves with 1 at once.
 *
 * Reasons are SIGTERM, SIGINT, a launcher that closed its IPC channel, and a parent that is gone (the process got another one):
 * without the last two a killed launcher would leave its services behind.
 *
 * @returns ends the supervision, for tests and for a drain that was begun otherwise
 */
export function superviseShutdown(options: ShutdownOptions): { stop(): void } {
  const { logger, drain, leave = process.exit, supervised = process, parentLookMilliseconds = 1_000 } = options;
  let isDraining = false;
  const begin = async (reason: string) => {
    isDraining = true;
    logger.info({ reason }, 'shutdown-begun');
    try {
      await drain(reason);
      logger.info({ reason }, 'shutdown-finished');
      leave(0);
    } catch (error) {
      logger.error({ reason, err: error }, 'shutdown-failed');
      leave(1);
    }
  };
  const onSignal = (signal: string) => () => {
    if (!isDraining) return void begin(signal);
    logger.info({ reason: signal }, 'shutdown-cut-short');
    leave(1);
  };
  const onOrphaned = (reason: string) => () => void (isDraining || begin(reason));
  const listeners: [string, () => void][] = [
    ['SIGTERM', onSignal('SIGTERM')],
    ['SIGINT', onSignal('SIGINT')],
    ['disconnect', onOrphaned('launcher-disconnected')],
  ];
  for (const [event, listener] of listeners) supervised.on(event, listener);
  const stopWatching = watchParent(supervised, parentLookMilliseconds, onOrphaned('parent-changed'));
  return {
    stop: () => {
      stopWatching();
      for (const [event, listener] of listeners) supervised.off(event, listener);
    },
  };
}

/** The parent of an orphan is another process; no event tells. */
function watchParent(supervised: SupervisedProcess, milliseconds: number, onChanged: () => void): () => void {
  const parent = supervised.ppid;
  const timer = setInterval(() => {
    if (supervised.ppid === parent) return;
    clearInterval(timer);
    onChanged();
  }, milliseconds);
  timer.unref();
  return () => clearInterval(timer);
}
