export { chiSquareQuantile } from './chi-square-quantile.ts';
export { choleskyInto, choleskyLogDeterminant, choleskySolveInto } from './cholesky.ts';
export { createFourierPlan, discreteFourierTransform, type FourierPlan } from './discrete-fourier-transform.ts';
export { ConvergenceError, DimensionError, DomainError, type ErrorFacts } from './errors.ts';
export {
  householderLeastSquares,
  type LeastSquaresProblem,
  type LeastSquaresSolution,
} from './householder-least-squares.ts';
export { invertSymmetricPositive } from './invert-symmetric-positive.ts';
export { logGamma } from './log-gamma.ts';
export { logSumExp } from './log-sum-exp.ts';
export { normalCdf } from './normal-distribution.ts';
export { normalQuantile } from './normal-quantile.ts';
export { median, quantile } from './order-statistics.ts';
export { createRandomStream, type RandomStream, type StreamKey } from './random-stream.ts';
export { studentQuantile } from './student-quantile.ts';
export { createEigenWorkspace, type EigenWorkspace, symmetricEigenInto } from './symmetric-eigen.ts';
