import type { BinWindows } from './bin-windows.ts';
import { type DiscrepancyPosterior, discrepancyPosterior } from './discrepancy-posterior.ts';
import { createParameterLayout, type LayoutPriors, type ParameterLayout, parameterValues } from './parameter-layout.ts';
import { posteriorEstimate } from './posterior-estimate.ts';
import type { RungContext } from './rung-fit.ts';
import { createSpectrumModel } from './spectrum-model.ts';
import type { SpectrumQuestion } from './spectrum-question.ts';

/** Do lines broaden with their intensity, as radiation damping makes them? */
export interface IntensityBroadening {
  readonly isNoticed: boolean;
  /** Excess decay of the strongest line over a vanishing one, 1/s, and its posterior sd. */
  readonly excessPerSecond: number;
  readonly excessSd: number;
  /** Excess over the decay that all lines share. */
  readonly excessFraction: number;
  /** Gain of log evidence by the term, nats. */
  readonly logEvidenceGain: number;
}

/** Noticed: at least this share of the common decay, this many sd from none, and this much better explained. */
const FRACTION_MIN = 0.1;
const SD_MIN = 4;
const GAIN_MIN = 10;

/** Fit the mode again with the broadening free and compare. */
export function intensityBroadening(
  question: SpectrumQuestion,
  priors: LayoutPriors,
  context: RungContext,
  bins: BinWindows,
  mode: DiscrepancyPosterior,
): IntensityBroadening {
  const layout = createParameterLayout(question, { ...priors, withIntensityBroadening: true });
  const model = createSpectrumModel(layout);
  const start = carryOver(context.model.layout, layout, mode.fit.standardised);
  model.freezeField(parameterValues(layout, start), mode.fit.amounts);
  const posterior = discrepancyPosterior({ ...context, model }, bins, start);
  const values = parameterValues(layout, posterior.fit.standardised);
  const excess = posteriorEstimate([{ weight: 1, posterior }], ({ fit }) => {
    const gradient = new Float64Array(layout.parameters.length + fit.amounts.length);
    gradient[layout.intensityBroadening] = layout.parameters[layout.intensityBroadening].unit;
    return { value: values[layout.intensityBroadening], gradient };
  });
  const excessFraction = excess.value / commonDecay(layout, values);
  const logEvidenceGain = posterior.logEvidence - mode.logEvidence;
  return {
    isNoticed: excessFraction > FRACTION_MIN && excess.value > SD_MIN * excess.sd && logEvidenceGain > GAIN_MIN,
    excessPerSecond: excess.value,
    excessSd: excess.sd,
    excessFraction,
    logEvidenceGain,
  };
}

/** Mean decay of the analytes' groups, without the excess. */
function commonDecay(layout: ParameterLayout, values: Float64Array): number {
  const decays = layout.parameters.flatMap((parameter, p) =>
    parameter.kind === 'log-decay' && parameter.compound !== layout.referenceIndex ? [Math.exp(values[p])] : [],
  );
  return decays.reduce((sum, decay) => sum + decay, 0) / decays.length;
}

/** The same values under a layout with one parameter more. */
function carryOver(from: ParameterLayout, to: ParameterLayout, standardised: Float64Array): Float64Array {
  const start = new Float64Array(to.parameters.length);
  let p = 0;
  to.parameters.forEach((parameter, q) => {
    if (parameter.kind === 'intensity-broadening') return;
    start[q] = standardised[p];
    p += 1;
  });
  if (p !== from.parameters.length) throw new RangeError('expected layouts that differ by the broadening alone');
  return start;
}
