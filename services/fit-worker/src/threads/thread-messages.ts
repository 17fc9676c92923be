import type { ProblemRecord } from '@spinassay/problems';
import type { AnalysisRequest } from '../analysis/analysis-request.ts';

/** To a thread: one analysis. It is sent nothing else until it has answered. */
export type ThreadOrder = {
  readonly request: AnalysisRequest;
  /** One Int32 in shared memory; 1 asks the analysis to stop at its next look. A message would not be read before the end. */
  readonly cancelFlag: Int32Array<SharedArrayBuffer>;
};

/** What an analysis made: canonical JSON and its digest, ready to be stored. */
export type AnalysisOutcome = {
  readonly resultText: string;
  readonly resultSha256: string;
  readonly recommendation: 'releasable' | 'held';
};

/** An error as it crosses the border of a thread, where classes do not survive. */
export type ThreadFailure = {
  readonly name: string;
  readonly message: string;
  readonly stack: string;
  /** Of a failure that a client may see. */
  readonly record?: ProblemRecord;
};

/** From a thread: `ready` once, when its program is loaded; then, for each order, any number of `progressed` and one of the others. */
export type ThreadReport =
  | { readonly kind: 'ready' }
  | { readonly kind: 'progressed'; readonly stage: string; readonly fraction: number }
  | { readonly kind: 'completed'; readonly outcome: AnalysisOutcome }
  | { readonly kind: 'failed'; readonly failure: ThreadFailure };
