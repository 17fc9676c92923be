/** Polls between notices in milliseconds: notices may be lost, so nobody relies on them alone. */
const POLL_MILLISECONDS = 2_000;

/** How to wait: for how long, who rings, and what ends the wait early. */
export type WaitPlan<T> = {
  readonly seconds: number;
  readonly query: () => Promise<T>;
  readonly isDone: (value: T) => boolean;
  /** Register for notices; returns how to stop. */
  readonly watch: (onNotice: () => void) => () => void;
  /** Ends the wait with the last value: the client left, or the service drains. */
  readonly signal: AbortSignal;
};

/**
 * Query until done or until the time is up; the last value queried is the answer in both cases.
 * The watcher is registered before the first query, so that no change falls between the two.
 */
export async function waitUntil<T>({ seconds, query, isDone, watch, signal }: WaitPlan<T>): Promise<T> {
  const deadline = performance.now() + seconds * 1_000;
  let wake: () => void = () => {};
  let isNoticed = false;
  const stop = watch(() => {
    isNoticed = true;
    wake();
  });
  const onAbort = (): void => wake();
  signal.addEventListener('abort', onAbort);
  try {
    for (;;) {
      isNoticed = false;
      const value = await query();
      const left = deadline - performance.now();
      if (isDone(value) || left <= 0 || signal.aborted) return value;
      if (isNoticed) continue;
      await new Promise<void>((resolve) => {
        const timer = setTimeout(resolve, Math.min(left, POLL_MILLISECONDS));
        wake = () => {
          clearTimeout(timer);
          resolve();
        };
      });
    }
  } finally {
    signal.removeEventListener('abort', onAbort);
    stop();
  }
}
