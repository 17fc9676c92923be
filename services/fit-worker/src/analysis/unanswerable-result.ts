import { type Reason, type ResultBody, resultSchemaName } from '@spinassay/contract';
import type { AnalysisRequest } from './analysis-request.ts';
import { CAUTIONS } from './cautions.ts';
import { sourcesOf } from './compose-result.ts';

/** The result of a question that could not be put: an honest "cannot tell" with its reasons, not a failure. */
export function unanswerableResult(request: AnalysisRequest, reasons: readonly Reason[]): ResultBody {
  const { method, compounds } = request;
  const { compoundId } = method.reference;
  return {
    schema: resultSchemaName,
    inputs: request.inputs,
    engineVersion: request.engineVersion,
    numericsId: request.numericsId,
    seed: request.seed.toString(),
    explainsSpectrum: { verdict: 'cannot-tell', detail: reasons[0]?.detail ?? '' },
    recommendation: {
      overall: 'held',
      byClaim: method.claims.map((claim) => ({ claim, recommendation: 'held', reasons: reasons.map((r) => r.code) })),
      reasons: [...reasons],
    },
    reference: { compoundId, scale: compounds[compoundId]?.body.scaleZero ?? 'DSS', found: false },
    signal: {
      sampleCount: request.samples.length / 2,
      firstSampleIndex: 0,
      dwellSeconds: request.dwellSeconds,
      observeFrequencyMHz: request.observeFrequencyMHz,
      noiseSdPerComponent: 0,
      phaseRadians: 0,
      timeZeroSamples: 0,
    },
    discrepancy: { mean: 0, sd: 0 },
    compounds: [],
    windows: [],
    unexplained: [],
    artefacts: [],
    radiationDamping: { noticed: false, detail: 'Not looked for.', facts: {} },
    diagnostics: { startCount: 0, evaluationCount: 0, modeCount: 0, converged: false },
    sources: sourcesOf(request),
    cautions: [...CAUTIONS],
  };
}
