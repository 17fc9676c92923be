export { choleskyInto, choleskyLogDeterminant, choleskySolveInto } from './cholesky.ts';
export { createFourierPlan, discreteFourierTransform, type FourierPlan } from './discrete-fourier-transform.ts';
export { ConvergenceError, DimensionError, DomainError, type ErrorFacts } from './errors.ts';
export { logSumExp } from './log-sum-exp.ts';
export { normalCdf } from './normal-distribution.ts';
export { median, quantile } from './order-statistics.ts';
export { createRandomStream, type RandomStream, type StreamKey } from './random-stream.ts';
export { createEigenWorkspace, type EigenWorkspace, symmetricEigenInto } from './symmetric-eigen.ts';
