import type { BinWindows } from './bin-windows.ts';
import { exchangeSymmetries } from './exchange-symmetry.ts';
import { type ParameterLayout, parameterValues } from './parameter-layout.ts';
import { type Estimate, type Functional, posteriorEstimate, type WeightedMode } from './posterior-estimate.ts';
import type { RungContext } from './rung-fit.ts';
import type {
  CompoundAnswer,
  CouplingAnswer,
  GroupAnswer,
  SpectrumAnswer,
  SpinSystemAnswer,
} from './spectrum-answer.ts';
import { upperLimit } from './upper-limit.ts';

/** Log Bayes factor from which no upper limit is worth its draws. */
const UPPER_LIMIT_BELOW = 5;

interface AnswerContext {
  readonly context: RungContext;
  /** Bins over the whole prior range. */
  readonly bins: BinWindows;
  readonly modes: readonly WeightedMode[];
  readonly logBayes: readonly number[];
  readonly seed: bigint;
}

type Fit = WeightedMode['posterior']['fit'];

/** Phase, time zero and common offset. */
export function scalarEstimates(
  layout: ParameterLayout,
  modes: readonly WeightedMode[],
): Pick<SpectrumAnswer, 'phaseRadians' | 'timeZeroSamples' | 'commonOffsetPpm'> {
  const estimate = (place: number): Estimate =>
    posteriorEstimate(modes, ({ fit }) => combination(layout, fit, [[place, 1]]));
  return {
    phaseRadians: estimate(layout.phase),
    timeZeroSamples: estimate(layout.timeZero),
    commonOffsetPpm: estimate(layout.commonOffset),
  };
}

/** What the posterior says of every compound asked for, the reference apart. */
export function compoundAnswers(at: AnswerContext): CompoundAnswer[] {
  const { layout } = at.context.model;
  return layout.compounds.flatMap((_, c) => (c === layout.referenceIndex ? [] : [compoundAnswer(at, c)]));
}

function compoundAnswer(at: AnswerContext, c: number): CompoundAnswer {
  const { modes, context } = at;
  const { layout } = context.model;
  const compound = layout.compounds[c];
  const best = modes[0].posterior;
  const limit = at.logBayes[c] < UPPER_LIMIT_BELOW ? limitOf(at, c) : undefined;
  const referenceAmount = layout.referenceIndex < 0 ? undefined : best.fit.amounts[layout.referenceIndex];
  return {
    id: compound.id,
    logBayesFactor: at.logBayes[c],
    amountPriorSd: context.amountSd[c],
    amount: posteriorEstimate(modes, ({ fit }) => amountFunctional(layout, fit, c)),
    amountOverReference:
      layout.referenceIndex < 0 ? undefined : posteriorEstimate(modes, ({ fit }) => quotient(layout, fit, c)),
    upperLimit: limit,
    upperLimitOverReference: limit === undefined || referenceAmount === undefined ? undefined : limit / referenceAmount,
    spinSystems: compound.spinSystems.map((_, s) => systemAnswer(layout, modes, c, s)),
  };
}

function limitOf({ context, bins, modes, seed }: AnswerContext, c: number): number {
  const { fit } = modes[0].posterior;
  const { layout } = context.model;
  const columns = layout.compounds.map(() => new Float64Array(2 * bins.binCount));
  context.model.compoundColumnsInto(parameterValues(layout, fit.standardised), bins, columns);
  const others = new Float64Array(2 * bins.binCount);
  columns.forEach((column, other) => {
    if (other === c) return;
    for (let k = 0; k < others.length; k += 1) others[k] += fit.amounts[other] * column[k];
  });
  return upperLimit(context, bins, { compound: c, base: fit.standardised, others, seed });
}

function systemAnswer(layout: ParameterLayout, modes: readonly WeightedMode[], c: number, s: number): SpinSystemAnswer {
  const system = layout.compounds[c].spinSystems[s];
  return {
    label: system.label,
    groups: system.groups.map((_, g) => groupAnswer(layout, modes, [c, s, g])),
    couplings: system.couplings.map((_, j) => couplingAnswer(layout, modes, [c, s, j])),
    exchangeable: exchangeSymmetries(system).map((pairs) =>
      pairs.flatMap(({ first, second }) => [system.couplings[first].label, system.couplings[second].label]),
    ),
  };
}

function groupAnswer(
  layout: ParameterLayout,
  modes: readonly WeightedMode[],
  [c, s, g]: readonly [number, number, number],
): GroupAnswer {
  const group = layout.compounds[c].spinSystems[s].groups[g];
  const places = layout.places[c][s];
  const groupCount = responsePlaces(layout, c).length;
  const best = modes[0].posterior;
  return {
    label: group.label,
    protonCount: group.spins.reduce((sum, spin) => sum + spin.protonCount, 0),
    shiftPpm: posteriorEstimate(
      modes,
      ({ fit }) =>
        combination(layout, fit, [
          [places.shift + g, 1],
          [layout.commonOffset, 1],
        ]),
      // A shape error of relative size eps may displace a whole multiplet, and the reference, by eps of its width, unseen.
      (eps) => eps * eps * squaredWidthsPpm(layout, best.fit, places.logDecay + g),
    ),
    shiftPullSd: modes[0].posterior.fit.standardised[places.shift + g],
    linewidthHz: posteriorEstimate(modes, ({ fit }) => linewidthFunctional(layout, fit, places.logDecay + g)),
    ratio:
      groupCount < 2
        ? undefined
        : posteriorEstimate(
            modes,
            ({ fit }) => ratioFunctional(layout, fit, c, places.response + g),
            // The area of a whole multiplet may be off by eps unseen; the mean of the groups carries 1 / groupCount of it.
            (eps) => eps * eps * (1 - 1 / groupCount),
          ),
  };
}

function couplingAnswer(
  layout: ParameterLayout,
  modes: readonly WeightedMode[],
  [c, s, j]: readonly [number, number, number],
): CouplingAnswer {
  const place = layout.places[c][s].coupling + j;
  return {
    label: layout.compounds[c].spinSystems[s].couplings[j].label,
    couplingHz: posteriorEstimate(modes, ({ fit }) => combination(layout, fit, [[place, 1]])),
    pullSd: modes[0].posterior.fit.standardised[place],
  };
}

/** A linear combination of parameter values. */
function combination(layout: ParameterLayout, fit: Fit, terms: readonly (readonly [number, number])[]): Functional {
  const gradient = new Float64Array(layout.parameters.length + fit.amounts.length);
  let value = 0;
  for (const [place, factor] of terms) {
    const { mean, unit } = layout.parameters[place];
    value += factor * (mean + unit * fit.standardised[place]);
    gradient[place] += factor * unit;
  }
  return { value, gradient };
}

/** Squared full widths of a group's lines and of the reference line, ppm^2. */
function squaredWidthsPpm(layout: ParameterLayout, fit: Fit, place: number): number {
  const own = linewidthFunctional(layout, fit, place).value;
  const reference =
    layout.referenceIndex < 0
      ? 0
      : linewidthFunctional(layout, fit, layout.places[layout.referenceIndex][0].logDecay).value;
  return (own * own + reference * reference) / (layout.hertzPerPpm * layout.hertzPerPpm);
}

/** Full width at half maximum R / pi, R = exp(log-decay). */
function linewidthFunctional(layout: ParameterLayout, fit: Fit, place: number): Functional {
  const { mean, unit } = layout.parameters[place];
  const value = Math.exp(mean + unit * fit.standardised[place]) / Math.PI;
  const gradient = new Float64Array(layout.parameters.length + fit.amounts.length);
  gradient[place] = value * unit;
  return { value, gradient };
}

function amountFunctional(layout: ParameterLayout, fit: Fit, c: number): Functional {
  const gradient = new Float64Array(layout.parameters.length + fit.amounts.length);
  gradient[layout.parameters.length + c] = 1;
  return { value: fit.amounts[c], gradient };
}

function quotient(layout: ParameterLayout, fit: Fit, c: number): Functional {
  const reference = fit.amounts[layout.referenceIndex];
  const gradient = new Float64Array(layout.parameters.length + fit.amounts.length);
  gradient[layout.parameters.length + c] = 1 / reference;
  gradient[layout.parameters.length + layout.referenceIndex] = -fit.amounts[c] / (reference * reference);
  return { value: fit.amounts[c] / reference, gradient };
}

function responsePlaces(layout: ParameterLayout, c: number): number[] {
  return layout.parameters.flatMap((parameter, p) =>
    parameter.kind === 'response' && parameter.compound === c ? [p] : [],
  );
}

/** Response of one group over the mean response of the compound's groups. */
function ratioFunctional(layout: ParameterLayout, fit: Fit, c: number, place: number): Functional {
  const all = responsePlaces(layout, c);
  const response = (p: number): number => layout.parameters[p].mean + layout.parameters[p].unit * fit.standardised[p];
  const mean = all.reduce((sum, p) => sum + response(p), 0) / all.length;
  const value = response(place) / mean;
  const gradient = new Float64Array(layout.parameters.length + fit.amounts.length);
  for (const p of all) gradient[p] = (-value / mean / all.length) * layout.parameters[p].unit;
  gradient[place] += layout.parameters[place].unit / mean;
  return { value, gradient };
}
