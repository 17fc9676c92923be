import type { NormalPrior } from './spectrum-question.ts';

/** T1 of small molecules, as a log-normal: median and factor of one sd (REFERENCE section 6: 0.5 to 10 s; from memory, weak). */
const T1_MEDIAN_SECONDS = 2.5;
const T1_FACTOR = 2;
/** Flip angle across the coil and receiver steps leave at least this much open (common practice, no source). */
const RESPONSE_SD_MIN = 5e-4;
/** Without a declared pulse, a group may have lost this much. */
const UNDECLARED: NormalPrior = { mean: 0.95, sd: 0.1 };
/** Abscissas of the log-normal, in sd. */
const QUADRATURE_STEPS = 61;
const QUADRATURE_REACH_SD = 3;

/**
 * Prior of a group's response factor from the repetition of the experiment: steady state after many equal pulses,
 * r = (1 - E) / (1 - E cos a), E = exp(-TR / T1), relative to full recovery; T1 unknown within its usual range.
 *
 * @source REFERENCE section 3, steady-state signal; Ernst & Anderson, Rev. Sci. Instrum. 37 (1966) 93
 */
export function responsePrior(pulse: {
  readonly flipAngleDegrees: number | undefined;
  readonly repetitionSeconds: number | undefined;
}): NormalPrior {
  if (pulse.flipAngleDegrees === undefined || pulse.repetitionSeconds === undefined) return UNDECLARED;
  const cosine = Math.cos((pulse.flipAngleDegrees * Math.PI) / 180);
  let weightSum = 0;
  let sum = 0;
  let squareSum = 0;
  for (let i = 0; i < QUADRATURE_STEPS; i += 1) {
    const z = QUADRATURE_REACH_SD * ((2 * i) / (QUADRATURE_STEPS - 1) - 1);
    const weight = Math.exp(-0.5 * z * z);
    const decay = Math.exp(-pulse.repetitionSeconds / (T1_MEDIAN_SECONDS * Math.exp(z * Math.log(T1_FACTOR))));
    const response = (1 - decay) / (1 - decay * cosine);
    weightSum += weight;
    sum += weight * response;
    squareSum += weight * response * response;
  }
  const mean = sum / weightSum;
  return { mean, sd: Math.max(RESPONSE_SD_MIN, Math.sqrt(Math.max(0, squareSum / weightSum - mean * mean))) };
}
