import { setTimeout as pause } from 'node:timers/promises';
import type { Bell } from '@spinassay/job-queue';
import type { Logger } from '@spinassay/service-runtime';
import { claimNext, type NoticeBoard, type Store, sweep, type WorkerSession } from '@spinassay/store';
import { createClaimLoop } from './jobs/claim-loop.ts';
import { FitStopped } from './jobs/fit-stopped.ts';
import type { EngineIdentity } from './jobs/load-analysis-request.ts';
import { performFit } from './jobs/perform-fit.ts';
import { keepSession } from './keep-session.ts';
import type { AnalysisThreads } from './threads/analysis-threads.ts';

export type FitWorkerOptions = {
  readonly store: Store;
  readonly bell: Pick<Bell, 'ring' | 'listen'>;
  readonly notices: Pick<NoticeBoard, 'watch'>;
  readonly threads: AnalysisThreads;
  readonly logger: Logger;
  readonly identity: EngineIdentity;
  readonly concurrency: number;
  openSession(): Promise<WorkerSession>;
  /** Be told once it can take jobs. */
  onReady?(): void;
};

export type FitWorker = {
  /** Take no new job; finish what is done within `graceSeconds`, hand back the rest. */
  drain(graceSeconds?: number): Promise<void>;
};

/** Covers hangs and paused machines only: the jobs of a worker that died are handed on as soon as a sweep sees its lock free. */
const leaseSeconds = 15;
const sweepMilliseconds = 2_000;
const heartbeatMilliseconds = 5_000;
/** A ring wakes one worker, which claims until nothing is left or it is full; more rings than workers wake nobody. */
const ringCountMax = 8;

/** Take jobs from the store, woken by the bell and by a sweep, until drained. It opens and closes nothing that it is given. */
export function createFitWorker(options: FitWorkerOptions): FitWorker {
  const { store, bell, notices, logger } = options;
  const stopping = new AbortController();
  const onTrouble = (error: unknown): void => logger.warn({ err: error }, 'database-was-away');
  const loop = createClaimLoop({
    concurrency: options.concurrency,
    onTrouble,
    claim: async () => {
      const workerId = session.current()?.workerId;
      if (workerId === undefined) return undefined;
      return (await claimNext(store, { workerId, kinds: ['fit'], leaseSeconds }))?.fence;
    },
    perform: (fence) => {
      logger.info({ fitId: fence.jobId, attempt: fence.attempt }, 'fit-claimed');
      const watchCancellation = (id: string, onNotice: () => void) => notices.watch('cancel', id, onNotice);
      return performFit(fence, { ...options, leaseSeconds, watchCancellation, stopping: stopping.signal });
    },
  });
  const session = keepSession({
    open: options.openSession,
    onTrouble,
    onOpened: () => {
      options.onReady?.();
      void loop.wake();
    },
  });
  const sweepOnce = async (): Promise<void> => {
    const { waitingCount, ...report } = await sweep(store);
    if (report.handedBackCount + report.failedCount > 0) logger.warn(report, 'lost-jobs-swept');
    void loop.wake();
    for (let count = Math.min(waitingCount, ringCountMax); count > 0; count -= 1) await bell.ring();
  };
  const beat = async (): Promise<void> => {
    const news = await session.current()?.heartbeat({ actualConcurrency: loop.activeCount() });
    if (news !== undefined) loop.setConcurrency(news.wantedConcurrency);
  };
  const stopSweeping = repeat(sweepOnce, sweepMilliseconds, onTrouble);
  const stopBeating = repeat(beat, heartbeatMilliseconds, onTrouble);
  // Without the bell the sweep still wakes us, only later.
  bell.listen(loop.wake).catch(onTrouble);

  return {
    drain: async (graceSeconds = 5) => {
      stopSweeping();
      const ended = loop.stop();
      await Promise.race([ended, pause(graceSeconds * 1_000, undefined, { ref: false })]);
      stopping.abort(new FitStopped('shutdown'));
      await ended;
      stopBeating();
      await session.close();
    },
  };
}

/** Do something again and again, never twice at once. */
function repeat(work: () => Promise<void>, milliseconds: number, onTrouble: (error: unknown) => void): () => void {
  let isWorking = false;
  const timer = setInterval(async () => {
    if (isWorking) return;
    isWorking = true;
    await work().catch(onTrouble);
    isWorking = false;
  }, milliseconds);
  return () => clearInterval(timer);
}
