import { type Fence, renewLease, type Store } from '@spinassay/store';
import { FitStopped } from './fit-stopped.ts';

export type LeaseOptions = {
  readonly store: Store;
  readonly fence: Fence;
  readonly leaseSeconds: number;
  /** Told of renewals that failed; the next one may succeed. */
  readonly onTrouble: (error: unknown) => void;
};

export type Lease = {
  /** Aborts with a FitStopped when the job is cancelled or no longer ours. */
  readonly signal: AbortSignal;
  /** What the work is at; told to the store with the next renewal. */
  tell(stage: string, fraction: number): void;
  /** Ask the store now, because there may be news. */
  look(): void;
  stop(): void;
};

/** How often progress is told. A renewal without news waits for a third of the lease. */
const tickMilliseconds = 1_000;

/** Keep a job for as long as its numerics run elsewhere, from the event loop, which nothing else keeps busy. */
export function keepLease({ store, fence, leaseSeconds, onTrouble }: LeaseOptions): Lease {
  const stopping = new AbortController();
  let news: { stage: string; fraction: number } | undefined;
  let renewedAt = performance.now();
  let isAsking = false;
  let isAskedAgain = false;

  const renew = async (): Promise<void> => {
    isAskedAgain = isAsking;
    // A slow answer must not let questions pile up; whoever asked meanwhile may know of something that it does not.
    if (isAsking || stopping.signal.aborted) return;
    isAsking = true;
    const told = news;
    news = undefined;
    try {
      const state = await renewLease(store, fence, { leaseSeconds, ...told });
      renewedAt = performance.now();
      if (state !== 'held') stopping.abort(new FitStopped(state));
    } catch (error) {
      news ??= told;
      onTrouble(error);
    }
    isAsking = false;
    if (isAskedAgain) void renew();
  };
  const timer = setInterval(() => {
    const isDue = performance.now() - renewedAt > (leaseSeconds * 1_000) / 3;
    if (isDue || news !== undefined) void renew();
  }, tickMilliseconds);
  return {
    signal: stopping.signal,
    tell: (stage, fraction) => {
      news = { stage, fraction };
    },
    look: () => void renew(),
    stop: () => clearInterval(timer),
  };
}
