import { canonicalOrder } from './canonical-order.ts';
import type { ParameterLayout } from './parameter-layout.ts';

interface Located {
  readonly standardised: Float64Array;
  readonly score: number;
}

/**
 * Two ends of a climb are one mode when they stand together, exchangeable labels aside; further apart, where a direction is
 * hardly determined, they must also score alike.
 */
const DISTANCE_MAX = 0.25;
const LOOSE_DISTANCE_MAX = 1;
const LOOSE_SCORE_MAX = 1;

/** Compare two ends of a climb, distances in prior sd of shifts and couplings. */
export function isSameMode(layout: ParameterLayout, a: Located, b: Located): boolean {
  const first = canonicalOrder(layout, a.standardised);
  const second = canonicalOrder(layout, b.standardised);
  let distance = 0;
  layout.parameters.forEach(({ kind }, p) => {
    if (kind === 'shift' || kind === 'coupling') distance = Math.max(distance, Math.abs(first[p] - second[p]));
  });
  return distance < DISTANCE_MAX || (distance < LOOSE_DISTANCE_MAX && Math.abs(a.score - b.score) < LOOSE_SCORE_MAX);
}
