import type { AnalysisRequest } from '../analysis/analysis-request.ts';
import { type AnalysisThread, startAnalysisThread, type ThreadHooks } from './analysis-thread.ts';
import type { AnalysisOutcome } from './thread-messages.ts';

/** The threads of one worker. Whoever calls decides how many analyses run at once; there are as many threads as were ever needed. */
export type AnalysisThreads = {
  /** Resolves when the first threads have loaded their program. @throws ThreadEnded when they cannot: no fit should be claimed then */
  ready(): Promise<void>;
  /** @throws AnalysisThrew, ThreadEnded, or the reason of the signal */
  analyse(request: AnalysisRequest, hooks: ThreadHooks): Promise<AnalysisOutcome>;
  /** End every thread, whatever it does. */
  close(): Promise<void>;
};

/**
 * Keep threads between analyses, so that the machine code made for the last one serves the next.
 *
 * @param readyCount threads to start at once
 */
export function createAnalysisThreads({ entry, readyCount }: { entry: URL; readyCount: number }): AnalysisThreads {
  const all = new Set<AnalysisThread>();
  const idle: AnalysisThread[] = [];
  const start = (): AnalysisThread => {
    const thread = startAnalysisThread(entry);
    all.add(thread);
    return thread;
  };
  for (let count = 0; count < readyCount; count += 1) idle.push(start());

  const takeIdle = (): AnalysisThread => {
    for (let thread = idle.pop(); thread !== undefined; thread = idle.pop()) {
      if (thread.isAlive()) return thread;
      all.delete(thread);
    }
    return start();
  };
  const first = [...all];
  return {
    ready: async () => {
      await Promise.all(first.map((thread) => thread.ready));
    },
    analyse: async (request, hooks) => {
      const thread = takeIdle();
      try {
        return await thread.analyse(request, hooks);
      } finally {
        if (thread.isAlive()) idle.push(thread);
        else all.delete(thread);
      }
    },
    close: async () => {
      await Promise.all([...all].map((thread) => thread.end()));
    },
  };
}
