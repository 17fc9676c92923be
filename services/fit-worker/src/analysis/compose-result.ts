import { type ResultBody, resultSchemaName } from '@spinassay/contract';
import type { SpectrumAnswer } from '@spinassay/spectrum-inference';
import type { AnalysisRequest } from './analysis-request.ts';
import { CAUTIONS } from './cautions.ts';
import { compoundResultOf } from './compound-result-of.ts';
import type { Judgement } from './judge.ts';

/** The result document of an answered question. */
export function composeResult(request: AnalysisRequest, answer: SpectrumAnswer, judgement: Judgement): ResultBody {
  const { inputs, engineVersion, numericsId, seed } = request;
  const damping = answer.intensityBroadening;
  return {
    schema: resultSchemaName,
    inputs,
    engineVersion,
    numericsId,
    seed: seed.toString(),
    explainsSpectrum: judgement.explainsSpectrum,
    recommendation: judgement.recommendation,
    reference: referenceOf(request, answer),
    signal: {
      sampleCount: request.samples.length / 2,
      firstSampleIndex: answer.firstSampleIndex,
      dwellSeconds: request.dwellSeconds,
      observeFrequencyMHz: request.observeFrequencyMHz,
      noiseSdPerComponent: answer.noise.sdPerComponent,
      phaseRadians: answer.phaseRadians.value,
      timeZeroSamples: answer.timeZeroSamples.value,
    },
    discrepancy: { mean: answer.discrepancy.mean, sd: answer.discrepancy.sd },
    compounds: answer.compounds.map((compound) => compoundResultOf(request, compound, judgement)),
    windows: answer.windows.map((window) => ({ ...window })),
    unexplained: answer.unexplained.map((region) => ({ ...region })),
    artefacts: [],
    radiationDamping: {
      noticed: damping?.isNoticed ?? false,
      detail:
        damping === undefined
          ? 'Not looked for: no compound of the method stands out.'
          : damping.isNoticed
            ? 'Line widths grow with line intensity.'
            : 'Line widths do not grow with line intensity beyond what is allowed.',
      facts:
        damping === undefined
          ? {}
          : {
              excessDecayPerSecond: damping.excessPerSecond,
              excessDecaySdPerSecond: damping.excessSd,
              excessFraction: damping.excessFraction,
              logEvidenceGain: damping.logEvidenceGain,
            },
    },
    diagnostics: {
      startCount: answer.search.startCount,
      evaluationCount: answer.search.evaluationCount,
      modeCount: answer.search.modeWeights.length,
      converged: answer.search.isConverged && answer.search.isAgreed,
      facts: {
        populationCount: answer.search.populationCount,
        bestModeWeight: answer.search.modeWeights[0] ?? 0,
        modelErrorPrior: `half-Cauchy of scale ${answer.discrepancy.priorScale}`,
      },
    },
    sources: sourcesOf(request),
    cautions: [...CAUTIONS],
  };
}

function referenceOf(
  { method, compounds }: AnalysisRequest,
  { reference, commonOffsetPpm }: SpectrumAnswer,
): ResultBody['reference'] {
  const { compoundId } = method.reference;
  const scale = compounds[compoundId]?.body.scaleZero ?? 'DSS';
  const offset = { shiftOffsetPpm: commonOffsetPpm.value, shiftOffsetSdPpm: commonOffsetPpm.sd };
  if (!reference.isFound) {
    return { compoundId, scale, found: false, signalToNoise: reference.signalToNoise, ...offset };
  }
  return {
    compoundId,
    scale,
    found: true,
    ...offset,
    linewidthHz: reference.linewidthHz,
    amplitude: reference.amplitude,
    amplitudeWithoutSatellites: reference.amplitudeWithoutSatellites,
    signalToNoise: reference.signalToNoise,
    facts: {
      frequencyFromCarrierHz: reference.frequencyHz,
      amplitudeWithSatellites: reference.amplitudeWithSatellites,
    },
  };
}

/** Every citation behind a catalogue value of this fit, once, in order of first use. */
export function sourcesOf({ compounds }: AnalysisRequest): string[] {
  const ids = Object.keys(compounds).sort();
  return [
    ...new Set(
      ids.flatMap((id) => {
        const body = compounds[id]?.body;
        if (body === undefined) return [];
        return body.spinSystems.flatMap((system) => [
          ...system.groups.map((group) => group.source),
          ...system.couplings.map((coupling) => coupling.source),
          ...(system.satellites ?? []).map((satellite) => satellite.source),
        ]);
      }),
    ),
  ];
}
