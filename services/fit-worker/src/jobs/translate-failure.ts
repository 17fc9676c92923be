import type { ProblemRecord } from '@spinassay/problems';
import { BlobDamagedError, FencedError, isStoreUnavailable } from '@spinassay/store';
import { AnalysisThrew, ThreadEnded } from '../threads/analysis-thread.ts';
import { FitStopped } from './fit-stopped.ts';

/** What becomes of a fit that did not end with a result. */
export type FailureDecision =
  | { readonly act: 'fail'; readonly problem: ProblemRecord }
  | { readonly act: 'hand-back'; readonly delaySeconds: number; readonly isForgiven: boolean }
  | { readonly act: 'cancel' }
  /** It is no longer ours: nothing may be written. */
  | { readonly act: 'leave' };

/** Numeric errors that speak of the inputs: their message says what was expected and what came. */
const inputErrorNames = new Set(['DomainError', 'SystemTooLargeError']);
/** A database that was away for longer than patience lasts is asked again after this; the trouble is not the fit's. */
const troubleDelaySeconds = 15;

/** Decide what a failure means. The only file of this service that translates failures. */
export function translateFailure(error: unknown): FailureDecision {
  if (error instanceof FitStopped) return translateStop(error);
  if (error instanceof FencedError) return { act: 'leave' };
  if (isStoreUnavailable(error)) return { act: 'hand-back', delaySeconds: troubleDelaySeconds, isForgiven: true };
  return { act: 'fail', problem: problemOf(error) };
}

function translateStop({ reason }: FitStopped): FailureDecision {
  if (reason === 'cancel-requested') return { act: 'cancel' };
  if (reason === 'fenced') return { act: 'leave' };
  return { act: 'hand-back', delaySeconds: 0, isForgiven: true };
}

/** The inner detail of a fault of ours stays in the log. */
function problemOf(error: unknown): ProblemRecord {
  if (error instanceof AnalysisThrew) {
    const { record, name, message } = error.failure;
    if (record !== undefined) return record;
    if (inputErrorNames.has(name)) {
      return { slug: 'analysis-not-possible', detail: `The analysis cannot take these inputs: ${message}.` };
    }
  }
  if (error instanceof BlobDamagedError) {
    return { slug: 'analysis-failed', detail: 'The stored signal no longer matches its digest; post it again.' };
  }
  if (error instanceof ThreadEnded) {
    return { slug: 'analysis-failed', detail: 'The analysis ended its thread, most likely for want of memory.' };
  }
  return { slug: 'analysis-failed', detail: 'The analysis met a fault of the service. Report this fit.' };
}
