import type { ResultBody } from '@spinassay/contract';
import { answerQuestion } from '@spinassay/spectrum-inference';
import type { AnalysisHooks, AnalysisRequest } from './analysis-request.ts';
import { composeResult } from './compose-result.ts';
import { judge } from './judge.ts';
import { questionOf } from './question-of.ts';
import { unanswerableResult } from './unanswerable-result.ts';

/**
 * One acquisition under one method: from the wire to the physics, the inference, and back with verdicts.
 *
 * @throws SearchCancelled when the hooks say so; SystemTooLargeError for a spin system beyond the exact engine;
 *   DomainError when the signal holds too few samples to say anything
 */
export function analyseAcquisition(request: AnalysisRequest, hooks: AnalysisHooks): ResultBody {
  const asked = questionOf(request);
  if (asked.kind === 'unanswerable') return unanswerableResult(request, asked.reasons);
  hooks.onProgress('searching', 0);
  const answer = answerQuestion(asked.question, {
    isCancelled: () => hooks.isCancelled(),
    onProgress: (fraction) => hooks.onProgress('searching', fraction),
  });
  hooks.onProgress('judging', 1);
  return composeResult(request, answer, judge(request, answer));
}
