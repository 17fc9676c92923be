import { Worker } from 'node:worker_threads';
import type { AnalysisRequest } from '../analysis/analysis-request.ts';
import type { AnalysisOutcome, ThreadFailure, ThreadOrder, ThreadReport } from './thread-messages.ts';

/** The analysis itself threw; `failure` is what it threw. */
export class AnalysisThrew extends Error {
  override readonly name = 'AnalysisThrew';
  readonly failure: ThreadFailure;

  constructor(failure: ThreadFailure) {
    super(`${failure.name}: ${failure.message}`);
    this.failure = failure;
  }
}

/** The thread ended under the analysis: out of memory, or a fault outside of anything that can be caught. */
export class ThreadEnded extends Error {
  override readonly name = 'ThreadEnded';
}

export type ThreadHooks = {
  /** Its reason is what a stopped analysis rejects with. */
  readonly signal: AbortSignal;
  onProgress(stage: string, fraction: number): void;
};

/** One thread with one analysis at a time. */
export type AnalysisThread = {
  /** @throws AnalysisThrew, ThreadEnded, or the reason of the signal; the samples of the request are moved into the thread */
  analyse(request: AnalysisRequest, hooks: ThreadHooks): Promise<AnalysisOutcome>;
  /** Resolves when its program is loaded. @throws ThreadEnded when that cannot be */
  readonly ready: Promise<void>;
  /** False once the thread has ended: it cannot be used again. */
  isAlive(): boolean;
  end(): Promise<void>;
};

/** An analysis looks at its flag between steps; one that does not within this time is ended with its thread. */
const unansweredMillisecondsMax = 500;
/** A fit with more objects than this is ended alone instead of taking the process along. Typed arrays lie outside of the limit. */
const resourceLimits = { maxOldGenerationSizeMb: 2_048 };

/** Start a thread that runs the program at `entry`. */
export function startAnalysisThread(entry: URL): AnalysisThread {
  // No flags are handed down: a process that runs sources must still run built files here, the only ones a thread can load.
  const worker = new Worker(entry, { resourceLimits, execArgv: [] });
  let fault: Error | undefined;
  let hasEnded = false;
  worker.on('error', (error) => {
    fault = error instanceof Error ? error : new Error(String(error));
  });
  worker.on('exit', () => {
    hasEnded = true;
  });
  const ready = new Promise<void>((resolve, reject) => {
    worker.once('message', () => resolve()); // The first message is always `ready`.
    worker.once('exit', () => reject(new ThreadEnded('the thread ended before it was ready', { cause: fault })));
  });
  ready.catch(() => {}); // An analysis in this thread meets the same end and tells of it.
  return {
    ready,
    analyse: (request, hooks) => analyseIn(worker, request, hooks, () => fault),
    isAlive: () => !hasEnded,
    end: async () => {
      await worker.terminate();
    },
  };
}

function analyseIn(
  worker: Worker,
  request: AnalysisRequest,
  hooks: ThreadHooks,
  faultOf: () => Error | undefined,
): Promise<AnalysisOutcome> {
  const cancelFlag = new Int32Array(new SharedArrayBuffer(Int32Array.BYTES_PER_ELEMENT));
  return new Promise<AnalysisOutcome>((resolve, reject) => {
    let unanswered: NodeJS.Timeout | undefined;
    const onAbort = (): void => {
      Atomics.store(cancelFlag, 0, 1);
      unanswered = setTimeout(() => void worker.terminate(), unansweredMillisecondsMax);
    };
    const finish = (settle: () => void): void => {
      clearTimeout(unanswered);
      hooks.signal.removeEventListener('abort', onAbort);
      worker.off('message', onReport).off('exit', onExit);
      settle();
    };
    // Whatever a stopped analysis ends with, it ended because it was stopped. A result that was ready before is a result.
    const fail = (error: Error): void =>
      finish(() => reject(hooks.signal.aborted ? (hooks.signal.reason as Error) : error));
    const onExit = (): void => fail(new ThreadEnded('the thread ended', { cause: faultOf() }));
    const onReport = (report: ThreadReport): void => {
      if (report.kind === 'ready') return;
      if (report.kind === 'progressed') hooks.onProgress(report.stage, report.fraction);
      else if (report.kind === 'completed') finish(() => resolve(report.outcome));
      else fail(new AnalysisThrew(report.failure));
    };
    worker.on('message', onReport).on('exit', onExit);
    if (hooks.signal.aborted) return finish(() => reject(hooks.signal.reason));
    hooks.signal.addEventListener('abort', onAbort, { once: true });
    const order: ThreadOrder = { request, cancelFlag };
    worker.postMessage(order, [request.samples.buffer as ArrayBuffer]);
  });
}
