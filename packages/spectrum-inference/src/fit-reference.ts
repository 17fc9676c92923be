import { discrepancyPosterior } from './discrepancy-posterior.ts';
import { createParameterLayout, type ParameterLayout, parameterValues } from './parameter-layout.ts';
import { alignPhase, fitRung } from './rung-fit.ts';
import { createSpectrumModel } from './spectrum-model.ts';
import type { CompoundQuestion, SpectrumQuestion } from './spectrum-question.ts';
import { rungBins, type UsableSignal } from './time-ladder.ts';

/** What the reference line alone says: the start of the joint fit. */
export interface ReferenceFit {
  readonly frequencyHz: number;
  readonly decayPerSecond: number;
  readonly phaseRadians: number;
  /** Signal of one proton at time zero. */
  readonly amplitude: number;
  /** sqrt(chi^2) share: rms of residual over rms of data in the window, baseline apart. */
  readonly residualFraction: number;
}

/** Window about the reference, wide enough for 29Si satellites at 3.3 Hz and a baseline. */
const HALF_WINDOW_HZ = 25;
/** Prior of an unknown decay: 1 Hz wide, a factor 2 either way. */
export const UNKNOWN_LOG_DECAY = { mean: Math.log(Math.PI), sd: Math.log(2) } as const;
/** Prior sd of time zero about its declared place, samples (REAL-DATA section 2). */
export const TIME_ZERO_SD_SAMPLES = 0.05;

/** Fit the reference line by itself, phase free. */
export function fitReference(
  question: SpectrumQuestion,
  reference: CompoundQuestion,
  signal: UsableSignal,
  at: { frequencyHz: number; noiseSd: number; amountSd: number },
): ReferenceFit {
  const layout = createParameterLayout(
    { ...question, compounds: [], reference },
    {
      referencePositionHz: { mean: at.frequencyHz, sd: 1 },
      phaseRadians: { mean: 0, sd: Number.POSITIVE_INFINITY },
      timeZeroSamples: { mean: question.timeZeroSamples, sd: 0 },
      logDecay: UNKNOWN_LOG_DECAY,
      withIntensityBroadening: false,
    },
  );
  const context = {
    model: createSpectrumModel(layout),
    noiseSd: at.noiseSd,
    amountSd: Float64Array.of(at.amountSd),
    signal,
  };
  const bins = rungBins(signal, 0, [
    { lowHz: at.frequencyHz - HALF_WINDOW_HZ, highHz: at.frequencyHz + HALF_WINDOW_HZ, baselineTermCount: 3 },
  ]);
  const start = alignPhase(context, bins, new Float64Array(layout.parameters.length));
  const { standardised } = fitRung(context, bins, start);
  const { fit } = discrepancyPosterior(context, bins, standardised);
  return summarise(layout, parameterValues(layout, fit.standardised), fit);
}

function summarise(
  layout: ParameterLayout,
  values: Float64Array,
  fit: { residual: Float64Array; amounts: Float64Array; bins: { data: Float64Array } },
): ReferenceFit {
  const square = (column: Float64Array): number => column.reduce((sum, x) => sum + x * x, 0);
  return {
    frequencyHz: values[layout.referencePosition],
    decayPerSecond: Math.exp(values[layout.places[0][0].logDecay]),
    phaseRadians: values[layout.phase],
    amplitude: fit.amounts[0],
    residualFraction: Math.sqrt(square(fit.residual) / square(fit.bins.data)),
  };
}
