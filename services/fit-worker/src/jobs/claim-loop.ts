/** Takes up jobs for as long as there are any and there is room. */
export type ClaimLoop = {
  /** There may be work. Resolves when all of it is taken up, or every place is. */
  wake(): Promise<void>;
  setConcurrency(concurrency: number): void;
  activeCount(): number;
  /** Claim nothing more. Resolves when the jobs that run have ended. */
  stop(): Promise<void>;
};

export type ClaimLoopOptions<Job> = {
  readonly concurrency: number;
  claim(): Promise<Job | undefined>;
  /** Must not throw. */
  perform(job: Job): Promise<void>;
  /** Told of claims that failed; the next wake tries again. */
  onTrouble(error: unknown): void;
};

/** Make a loop that claims one job at a time and performs as many at once as it may. A place that gets free claims by itself. */
export function createClaimLoop<Job>({ claim, perform, onTrouble, ...options }: ClaimLoopOptions<Job>): ClaimLoop {
  const active = new Set<Promise<void>>();
  let { concurrency } = options;
  let isStopped = false;
  let isWokenAgain = false;
  let claiming: Promise<void> | undefined;

  const begin = (job: Job): void => {
    const running = perform(job).finally(() => {
      active.delete(running);
      void wake();
    });
    active.add(running);
  };
  const claimAll = async (): Promise<void> => {
    do {
      isWokenAgain = false;
      while (!isStopped && active.size < concurrency) {
        const job = await claim();
        if (job === undefined) break;
        begin(job);
      }
    } while (isWokenAgain);
  };
  const claimAndForget = async (): Promise<void> => {
    try {
      await claimAll();
    } catch (error) {
      isWokenAgain = false;
      onTrouble(error);
    }
    claiming = undefined;
    if (isWokenAgain) void wake();
  };
  const wake = (): Promise<void> => {
    // Work that came while a claim found nothing must not be slept through.
    isWokenAgain = true;
    claiming ??= claimAndForget();
    return claiming;
  };
  return {
    wake,
    setConcurrency: (wanted) => {
      concurrency = wanted;
      void wake();
    },
    activeCount: () => active.size,
    stop: async () => {
      isStopped = true;
      await claiming;
      await Promise.all(active);
    },
  };
}
