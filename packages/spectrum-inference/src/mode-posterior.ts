import { logSumExp } from '@spinassay/numerics';
import type { BinWindows } from './bin-windows.ts';
import { canonicalOrder } from './canonical-order.ts';
import { type DiscrepancyPosterior, discrepancyPosterior } from './discrepancy-posterior.ts';
import { type GramSystem, gramSystem, normalPosterior } from './normal-posterior.ts';
import type { WeightedMode } from './posterior-estimate.ts';
import type { RungContext } from './rung-fit.ts';
import { isSameMode } from './same-mode.ts';

/** Modes worth a posterior of their own. */
const MODES_MAX = 3;
const WEIGHT_MIN = 1e-4;

/** Posteriors of the modes of a search on the bins of the statistics, weighted by their evidence, best first. */
export function weighModes(
  context: RungContext,
  bins: BinWindows,
  modes: readonly { readonly standardised: Float64Array }[],
): WeightedMode[] {
  const { layout } = context.model;
  const distinct: DiscrepancyPosterior[] = [];
  for (const mode of modes.slice(0, MODES_MAX)) {
    const posterior = discrepancyPosterior(context, bins, canonicalOrder(layout, mode.standardised));
    if (!distinct.some((other) => isSame(context, other, posterior))) distinct.push(posterior);
  }
  const total = logSumExp(Float64Array.from(distinct, (posterior) => posterior.logEvidence));
  return distinct
    .map((posterior) => ({ weight: Math.exp(posterior.logEvidence - total), posterior }))
    .filter((mode) => mode.weight > WEIGHT_MIN)
    .sort((a, b) => b.weight - a.weight);
}

function isSame({ model }: RungContext, a: DiscrepancyPosterior, b: DiscrepancyPosterior): boolean {
  return isSameMode(
    model.layout,
    { standardised: a.fit.standardised, score: 0 },
    { standardised: b.fit.standardised, score: 0 },
  );
}

/**
 * Log Bayes factor of each compound being there, nats, at the best mode.
 *
 * Both hypotheses are weighed under the same noise model: sigma, the local model of the full fit and each eps, averaged over
 * the posterior of eps. Estimated apart, a model without the compound would swallow it as model error (DESIGN section 5).
 */
export function logBayesFactors(context: RungContext, modes: readonly WeightedMode[]): number[] {
  const { fit, components, noise } = modes[0].posterior;
  const systems = new Map<number, GramSystem>();
  const systemAt = (eps: number): GramSystem => {
    const known = systems.get(eps) ?? gramSystem(fit, noise, eps);
    systems.set(eps, known);
    return known;
  };
  return fit.layout.compounds.map((_, c) =>
    components.reduce((sum, { eps, envelopeSd, weight, posterior }) => {
      const hypothesis = { amountSd: context.amountSd, envelopeSd, without: [c] };
      const without = normalPosterior(fit, systemAt(eps), hypothesis);
      return sum + weight * (posterior.logEvidence - without.logEvidence);
    }, 0),
  );
}
