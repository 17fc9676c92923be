import { ConvergenceError } from './errors.ts';

/** Halving from the widest bracket of doubles to neighbours takes about 1,100 + 53 steps; Newton needs some ten. */
const STEPS_MAX = 1200;
/** Two roundings of the argument: closer, Newton's steps are noise. */
const RELATIVE_STEP_MIN = 2 * Number.EPSILON;

/**
 * The positive zero of an increasing function: Newton's method, halving wherever it would leave the bracket.
 *
 * @param start positive guess
 * @param at value and slope of the function at x > 0
 * @throws ConvergenceError when no sign change is found, or the value is not a number
 * @source Press et al., Numerical Recipes (1992) section 9.4, with a bracket that is grown first
 */
export function increasingRoot(start: number, at: (x: number) => { value: number; slope: number }): number {
  let low = 0;
  let high = Number.POSITIVE_INFINITY;
  let x = start;
  for (let step = 0; step < STEPS_MAX; step += 1) {
    const { value, slope } = at(x);
    if (Number.isNaN(value)) break;
    if (value === 0) return x;
    if (value < 0) low = x;
    else high = x;
    let next = x - value / slope;
    // Before there is an upper end a step may only double: a flat tail would throw it out of range.
    if (high === Number.POSITIVE_INFINITY) next = next > low && next < 2 * x ? next : 2 * x;
    else if (!(next > low && next < high)) next = low + 0.5 * (high - low);
    if (Math.abs(next - x) <= RELATIVE_STEP_MIN * x) return next;
    x = next;
  }
  throw new ConvergenceError(`expected a zero between ${low} and ${high}`, { low, high });
}
