import type { MessagePort } from 'node:worker_threads';
import { canonicalJson, type ResultBody, resultBodySchema, sha256Hex } from '@spinassay/contract';
import { ProblemError } from '@spinassay/problems';
import type { AnalysisHooks, AnalysisRequest } from '../analysis/analysis-request.ts';
import type { AnalysisOutcome, ThreadFailure, ThreadOrder, ThreadReport } from './thread-messages.ts';

export type Analyse = (request: AnalysisRequest, hooks: AnalysisHooks) => ResultBody;

/** News more often than this are read by nobody: the lease that carries them is renewed once a second. */
const progressMillisecondsMin = 200;

/** Serve analyses inside a thread, one after the other, until the thread is ended. */
export function serveAnalyses(port: MessagePort, analyse: Analyse): void {
  const report = (message: ThreadReport): void => port.postMessage(message);
  port.on('message', (order: ThreadOrder) => {
    try {
      report({ kind: 'completed', outcome: outcomeOf(analyse(order.request, hooksOf(order, report))) });
    } catch (error) {
      report({ kind: 'failed', failure: describe(error) });
    }
  });
  report({ kind: 'ready' });
}

function hooksOf({ cancelFlag }: ThreadOrder, report: (message: ThreadReport) => void): AnalysisHooks {
  let reportedAt = Number.NEGATIVE_INFINITY;
  return {
    isCancelled: () => Atomics.load(cancelFlag, 0) !== 0,
    onProgress: (stage, fraction) => {
      const now = performance.now();
      if (now - reportedAt < progressMillisecondsMin) return;
      reportedAt = now;
      report({ kind: 'progressed', stage, fraction });
    },
  };
}

/** A result outside the contract is a bug of ours; it must not be stored, where it would stay for ever. */
function outcomeOf(result: ResultBody): AnalysisOutcome {
  const resultText = canonicalJson(result);
  const judged = resultBodySchema.safeParse(result);
  if (!judged.success) throw new TypeError(`the result is outside the contract: ${judged.error.message}`);
  return { resultText, resultSha256: sha256Hex(resultText), recommendation: result.recommendation.overall };
}

function describe(error: unknown): ThreadFailure {
  if (!(error instanceof Error)) return { name: 'Error', message: String(error), stack: '' };
  const { name, message, stack = '' } = error;
  return { name, message, stack, ...(error instanceof ProblemError ? { record: error.record } : {}) };
}
