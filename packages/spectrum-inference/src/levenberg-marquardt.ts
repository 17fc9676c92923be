import { ConvergenceError } from '@spinassay/numerics';
import { solvePositive } from './solve-positive.ts';
import { dot, evaluateFit, type FitPoint, type FitTarget, jacobianColumns } from './spectrum-fit.ts';

export interface ClimbOptions {
  readonly iterationsMax: number;
  /** Stop when an accepted step gains less than this, nats. */
  readonly gainMin: number;
}

export interface ClimbReport {
  readonly point: FitPoint;
  readonly converged: boolean;
  readonly evaluationCount: number;
}

/** Damping: start, and what an accepted and a rejected step do to it (INFERENCE, search step 3). */
const DAMPING_START = 1e-2;
const DAMPING_ACCEPT = 0.2;
const DAMPING_REJECT = 5;
const DAMPING_MAX = 1e6;
/** Longest step of one standardised parameter; longer ones leave the range where the linear model means anything. */
const STEP_MAX = 2;
/** Standardised parameters stay within this many prior sd. */
const REACH_MAX = 8;

/**
 * Climb to the nearest mode of one likelihood by Levenberg-Marquardt with the amounts eliminated.
 *
 * @source Levenberg 1944, Marquardt 1963; variable projection: Golub & Pereyra, SIAM J. Numer. Anal. 10 (1973) 413
 */
export function climb(target: FitTarget, start: Float64Array, options: ClimbOptions): ClimbReport {
  let point = evaluateFit(target, start);
  let evaluationCount = 1;
  let damping = DAMPING_START;
  for (let iteration = 0; iteration < options.iterationsMax; iteration += 1) {
    const system = normalEquations(target, point);
    let gain = 0;
    let improved = false;
    while (damping <= DAMPING_MAX) {
      const next = evaluateFit(target, dampedStep(system, point, damping));
      evaluationCount += 1;
      if (next.objective < point.objective) {
        gain = point.objective - next.objective;
        point = next;
        damping *= DAMPING_ACCEPT;
        improved = true;
        break;
      }
      // A rejected step that hardly changes anything is the mode itself, to rounding.
      if (next.objective - point.objective < 1e-3 * options.gainMin) break;
      damping *= DAMPING_REJECT;
    }
    if (!improved || gain < options.gainMin) return { point, converged: true, evaluationCount };
  }
  return { point, converged: false, evaluationCount };
}

/** Gauss-Newton system over parameters and amounts together: (P + C). */
export interface NormalEquations {
  readonly size: number;
  readonly parameterCount: number;
  /** (size x size) curvature of the objective, priors included. */
  readonly matrix: Float64Array;
  /** (size) downhill gradient. */
  readonly gradient: Float64Array;
}

/** Build the Gauss-Newton curvature and gradient at a point. */
export function normalEquations(target: FitTarget, point: FitPoint): NormalEquations {
  const columns = [...jacobianColumns(target, point), ...point.compoundColumns];
  const parameterCount = columns.length - point.compoundColumns.length;
  const size = columns.length;
  const matrix = new Float64Array(size * size);
  const gradient = new Float64Array(size);
  for (let i = 0; i < size; i += 1) {
    for (let j = 0; j <= i; j += 1) {
      const value = dot(columns[i], columns[j]);
      matrix[i * size + j] = value;
      matrix[j * size + i] = value;
    }
    const isParameter = i < parameterCount;
    const c = i - parameterCount;
    const precision = isParameter ? target.precision[i] : 1 / (target.amountSd[c] * target.amountSd[c]);
    const at = isParameter ? point.standardised[i] : point.amounts[c];
    matrix[i * size + i] += Number.isFinite(precision) ? precision : 0;
    gradient[i] = dot(columns[i], point.residual) - (at === 0 ? 0 : precision * at);
  }
  for (let i = 0; i < parameterCount; i += 1)
    if (!Number.isFinite(target.precision[i])) freeze(matrix, gradient, size, i);
  return { size, parameterCount, matrix, gradient };
}

/** A parameter with a prior of no width stays where it is. */
function freeze(matrix: Float64Array, gradient: Float64Array, size: number, index: number): void {
  for (let j = 0; j < size; j += 1) {
    matrix[index * size + j] = 0;
    matrix[j * size + index] = 0;
  }
  matrix[index * size + index] = 1;
  gradient[index] = 0;
}

function dampedStep(system: NormalEquations, point: FitPoint, damping: number): Float64Array {
  const { size, parameterCount, matrix, gradient } = system;
  const damped = matrix.slice();
  for (let i = 0; i < size; i += 1) damped[i * size + i] *= 1 + damping;
  const step = gradient.slice();
  try {
    solvePositive(damped, step);
  } catch (error) {
    // A system singular to rounding: the steepest descent, scaled by the diagonal, is a valid damped step.
    if (!(error instanceof ConvergenceError)) throw error;
    for (let i = 0; i < size; i += 1) step[i] = gradient[i] / damped[i * size + i];
  }
  let longest = 0;
  for (let i = 0; i < parameterCount; i += 1) longest = Math.max(longest, Math.abs(step[i]));
  const scale = longest > STEP_MAX ? STEP_MAX / longest : 1;
  return point.standardised.map((t, p) => Math.max(-REACH_MAX, Math.min(REACH_MAX, t + scale * step[p])));
}
