import type { ParameterLayout } from './parameter-layout.ts';

/** Changes whose priors cost more than this are not tried, nats; and how many at most, cheapest first. */
const COST_MAX = 8;
const MOVES_MAX = 6;
/** Exchanging values closer than this changes nothing worth a climb: Hz for couplings, ppm for shifts. */
const COUPLING_DIFFERENCE_MIN_HZ = 0.3;
const SHIFT_DIFFERENCE_MIN_PPM = 0.002;

/**
 * Single discrete changes of a mode that its priors allow: the sign of one coupling, two couplings of a system exchanged, two
 * shifts of groups of equal size exchanged.
 *
 * @returns new vectors, the cheapest by prior first
 * @source SEARCH.md M2, single exchanges; INFERENCE.md, near symmetries
 */
export function repairMoves(layout: ParameterLayout, standardised: Float64Array): Float64Array[] {
  const moves: { cost: number; at: Float64Array }[] = [];
  const value = (p: number): number => layout.parameters[p].mean + layout.parameters[p].unit * standardised[p];
  const consider = (changes: readonly (readonly [number, number])[]): void => {
    const at = standardised.slice();
    let cost = 0;
    for (const [place, next] of changes) {
      at[place] = (next - layout.parameters[place].mean) / layout.parameters[place].unit;
      cost += 0.5 * (at[place] * at[place] - standardised[place] * standardised[place]);
    }
    if (cost < COST_MAX) moves.push({ cost, at });
  };
  layout.parameters.forEach((parameter, p) => {
    if (parameter.unit === 0 || (parameter.kind !== 'coupling' && parameter.kind !== 'shift')) return;
    if (parameter.kind === 'coupling') consider([[p, -value(p)]]);
    layout.parameters.slice(0, p).forEach((other, q) => {
      if (other.kind !== parameter.kind || other.compound !== parameter.compound || other.system !== parameter.system)
        return;
      const difference = Math.abs(value(p) - value(q));
      const isWorth =
        parameter.kind === 'coupling'
          ? difference > COUPLING_DIFFERENCE_MIN_HZ
          : difference > SHIFT_DIFFERENCE_MIN_PPM && protonCount(layout, p) === protonCount(layout, q);
      if (isWorth && other.unit > 0) {
        consider([
          [p, value(q)],
          [q, value(p)],
        ]);
      }
    });
  });
  moves.sort((a, b) => a.cost - b.cost);
  return moves.slice(0, MOVES_MAX).map((move) => move.at);
}

function protonCount(layout: ParameterLayout, place: number): number {
  const { compound, system, item } = layout.parameters[place];
  const group = layout.compounds[compound].spinSystems[system].groups[item];
  return group.spins.reduce((sum, spin) => sum + spin.protonCount, 0);
}
