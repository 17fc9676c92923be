import { createRandomStream, normalCdf } from '@spinassay/numerics';
import type { BinWindows } from './bin-windows.ts';
import { createWhiteWhitener } from './noise-whitener.ts';
import { parameterValues } from './parameter-layout.ts';
import type { RungContext } from './rung-fit.ts';
import { dot } from './spectrum-fit.ts';

/** Draws of shifts, couplings and widths from the posterior of everything else and the prior of the compound. */
const DRAW_COUNT = 200;
const BISECTIONS = 60;

/**
 * The amount below which the compound lies with 95 % probability, given that it is not negative.
 *
 * Its shifts and couplings are not known when it is not seen: the limit is the 95 % point of a mixture over draws from their
 * prior, each weighted by the marginal likelihood of its place. Amount prior: flat on the non-negative half line.
 *
 * @param base standardised parameters of everything else
 * @param others (2 binCount) model of the other compounds
 * @returns signal of one proton at time zero
 */
export function upperLimit(
  context: RungContext,
  bins: BinWindows,
  at: { compound: number; base: Float64Array; others: Float64Array; seed: bigint },
): number {
  const { model, noiseSd } = context;
  const { layout } = model;
  const whitener = createWhiteWhitener(bins, new Float64Array(bins.windows.length).fill(noiseSd));
  const data = bins.data.map((value, k) => value - at.others[k]);
  whitener.whitenInPlace(data);
  const random = createRandomStream({ seed: at.seed, purpose: 'upper-limit', population: at.compound });
  const columns = layout.compounds.map(() => new Float64Array(2 * bins.binCount));
  const truncated = Array.from({ length: DRAW_COUNT }, () => {
    const standardised = at.base.slice();
    layout.parameters.forEach(({ kind, compound, variance }, p) => {
      const isOwn = compound === at.compound && (kind === 'shift' || kind === 'coupling' || kind === 'log-decay');
      const draw = random.nextNormal();
      if (isOwn || kind === 'common-offset') standardised[p] = draw;
      // A phase that nothing fixes is anywhere.
      if (kind === 'phase' && !Number.isFinite(variance)) standardised[p] = 2 * Math.PI * random.nextUniform();
    });
    model.compoundColumnsInto(parameterValues(layout, standardised), bins, columns);
    const column = columns[at.compound];
    whitener.whitenInPlace(column);
    const precision = dot(column, column);
    const mean = dot(column, data) / precision;
    const sd = 1 / Math.sqrt(precision);
    const positive = normalCdf(mean / sd);
    return {
      mean,
      sd,
      positive,
      logWeight: (0.5 * mean * mean) / (sd * sd) + Math.log(sd) + Math.log(Math.max(positive, 1e-300)),
    };
  });
  return mixtureQuantile(truncated, 0.95);
}

interface Truncated {
  readonly mean: number;
  readonly sd: number;
  readonly positive: number;
  readonly logWeight: number;
}

function mixtureQuantile(draws: readonly Truncated[], probability: number): number {
  const top = Math.max(...draws.map((draw) => draw.logWeight));
  const weights = draws.map((draw) => Math.exp(draw.logWeight - top));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const below = (x: number): number =>
    draws.reduce((sum, { mean, sd, positive }, i) => {
      const share = positive > 0 ? Math.max(0, normalCdf((x - mean) / sd) - (1 - positive)) / positive : 1;
      return sum + (weights[i] / total) * share;
    }, 0);
  let low = 0;
  let high = Math.max(...draws.map(({ mean, sd }) => Math.max(0, mean) + 10 * sd));
  for (let i = 0; i < BISECTIONS; i += 1) {
    const middle = (low + high) / 2;
    if (below(middle) < probability) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
