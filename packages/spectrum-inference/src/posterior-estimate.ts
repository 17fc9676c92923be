import { choleskySolveInto, normalCdf } from '@spinassay/numerics';
import type { DiscrepancyPosterior } from './discrepancy-posterior.ts';

/** A number with its posterior. */
export interface Estimate {
  readonly value: number;
  readonly sd: number;
  /** Central 95 % interval. */
  readonly low95: number;
  readonly high95: number;
}

/** A smooth function of parameters and amounts at the place of linearisation: its value and its gradient. */
export interface Functional {
  readonly value: number;
  /** (P + C) derivative by each standardised parameter, then each amount. */
  readonly gradient: Float64Array;
}

/** A mode with its share of the posterior. */
export interface WeightedMode {
  readonly weight: number;
  readonly posterior: DiscrepancyPosterior;
}

interface Normal {
  readonly weight: number;
  readonly mean: number;
  readonly variance: number;
}

/**
 * Mean, sd and interval of a function of the parameters under a mixture of normals over modes and eps (delta method in each).
 *
 * @param extraVariance adds to the variance of every component, given eps: what no residual can show
 */
export function posteriorEstimate(
  modes: readonly WeightedMode[],
  functional: (posterior: DiscrepancyPosterior) => Functional,
  extraVariance: (eps: number) => number = () => 0,
): Estimate {
  const normals = modes.flatMap((mode) => normalsOf(mode, functional(mode.posterior), extraVariance));
  const value = normals.reduce((sum, n) => sum + n.weight * n.mean, 0);
  const variance = normals.reduce((sum, n) => sum + n.weight * (n.variance + (n.mean - value) * (n.mean - value)), 0);
  return {
    value,
    sd: Math.sqrt(variance),
    low95: mixtureQuantile(normals, 0.025),
    high95: mixtureQuantile(normals, 0.975),
  };
}

function normalsOf(
  mode: WeightedMode,
  { value, gradient }: Functional,
  extraVariance: (eps: number) => number,
): Normal[] {
  return mode.posterior.components.map(({ eps, weight, posterior }) => {
    const { indices, step, factor } = posterior;
    const reduced = Float64Array.from(indices, (index) => (index < gradient.length ? gradient[index] : 0));
    const solved = new Float64Array(reduced.length);
    choleskySolveInto(reduced.length, factor, reduced, solved);
    let shift = 0;
    let variance = 0;
    for (let i = 0; i < reduced.length; i += 1) {
      shift += reduced[i] * step[i];
      variance += reduced[i] * solved[i];
    }
    return { weight: mode.weight * weight, mean: value + shift, variance: variance + extraVariance(eps) };
  });
}

/** Steps of bisection: 60 halvings of the bracket reach rounding. */
const BISECTIONS = 60;
/** A normal has no mass worth counting beyond this many sd. */
const BRACKET_SD = 10;

function mixtureQuantile(normals: readonly Normal[], probability: number): number {
  let low = Math.min(...normals.map((n) => n.mean - BRACKET_SD * Math.sqrt(n.variance)));
  let high = Math.max(...normals.map((n) => n.mean + BRACKET_SD * Math.sqrt(n.variance)));
  for (let i = 0; i < BISECTIONS; i += 1) {
    const middle = (low + high) / 2;
    const below = normals.reduce((sum, n) => sum + n.weight * cdf(n, middle), 0);
    if (below < probability) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

function cdf({ mean, variance }: Normal, x: number): number {
  return variance > 0 ? normalCdf((x - mean) / Math.sqrt(variance)) : x < mean ? 0 : 1;
}
