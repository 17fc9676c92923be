/** Feedback of the whole signal on every line through the coil. */
export interface RadiationDamping {
  /** Decay that a lone line of signal `ofSignal` gains, 1/s; a tuned coil. */
  readonly decayPerSecond: number;
  /** Angular frequency that it loses, rad/s; a coil that is off tune. */
  readonly pullRadPerSecond: number;
  readonly ofSignal: number;
  /** Steps of the feedback within one dwell; doubling them quarters the error. */
  readonly stepsPerSample: number;
}

/** Most steps of one FID; the work grows as their square: half a minute. */
export const FEEDBACK_STEP_COUNT_MAX = 131072;

/**
 * Radiation damping in linear form: dM_l/dt = (i w_l - R_l) M_l - k a_l S, S = sum M_l, M_l(0) = a_l, k = (decay + i pull) / ofSignal.
 *
 * Its solution keeps no line list: S(t) = F(t) - k integral_0^t K(t - s) S(s) ds with the free signal F and the free answer to a
 * tip at time zero K. The integral is stepped by the trapezoid rule from the first sample on, where the feedback is taken to begin.
 *
 * @param free   (2 stepCount) F at the steps, interleaved
 * @param answer (2 stepCount) K at 0, 1, ... steps, interleaved; F itself when the first sample lies at time zero
 * @returns (2 stepCount) S, interleaved
 * @cost O(stepCount^2)
 * @source law: Bloembergen & Pound, Phys. Rev. 95 (1954) 8, for small tips (from memory); rule: Linz, Analytical and Numerical
 *   Methods for Volterra Equations (1985), ch. 7 (from memory)
 */
export function feedBack(
  free: Float64Array,
  answer: Float64Array,
  damping: RadiationDamping,
  stepSeconds: number,
): Float64Array {
  const gainRe = (damping.decayPerSecond / damping.ofSignal) * stepSeconds;
  const gainIm = (damping.pullRadPerSecond / damping.ofSignal) * stepSeconds;
  // 1 + gain K(0) / 2, inverted: the newest sample feeds back on itself for half a step.
  const ownRe = 1 + (gainRe * answer[0] - gainIm * answer[1]) / 2;
  const ownIm = (gainRe * answer[1] + gainIm * answer[0]) / 2;
  const square = ownRe * ownRe + ownIm * ownIm;
  const signal = new Float64Array(free.length);
  signal[0] = free[0];
  signal[1] = free[1];
  for (let n = 1; n < free.length / 2; n += 1) {
    let sumRe = (answer[2 * n] * signal[0] - answer[2 * n + 1] * signal[1]) / 2;
    let sumIm = (answer[2 * n] * signal[1] + answer[2 * n + 1] * signal[0]) / 2;
    for (let j = 1; j < n; j += 1) {
      const kRe = answer[2 * (n - j)];
      const kIm = answer[2 * (n - j) + 1];
      sumRe += kRe * signal[2 * j] - kIm * signal[2 * j + 1];
      sumIm += kRe * signal[2 * j + 1] + kIm * signal[2 * j];
    }
    const re = free[2 * n] - (gainRe * sumRe - gainIm * sumIm);
    const im = free[2 * n + 1] - (gainRe * sumIm + gainIm * sumRe);
    signal[2 * n] = (re * ownRe + im * ownIm) / square;
    signal[2 * n + 1] = (im * ownRe - re * ownIm) / square;
  }
  return signal;
}
