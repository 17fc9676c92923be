import { canonicalOrder } from './canonical-order.ts';
import type { ParameterLayout } from './parameter-layout.ts';

interface Located {
  readonly standardised: Float64Array;
  readonly score: number;
}

/** Two ends of a climb are one mode when they score alike and stand together, exchangeable labels aside. */
const SCORE_MAX = 0.5;
const DISTANCE_MAX = 0.25;

/** Compare two ends of a climb, distances in prior sd of shifts and couplings. */
export function isSameMode(layout: ParameterLayout, a: Located, b: Located): boolean {
  if (Math.abs(a.score - b.score) > SCORE_MAX) return false;
  const first = canonicalOrder(layout, a.standardised);
  const second = canonicalOrder(layout, b.standardised);
  return layout.parameters.every(
    ({ kind }, p) => (kind !== 'shift' && kind !== 'coupling') || Math.abs(first[p] - second[p]) < DISTANCE_MAX,
  );
}
