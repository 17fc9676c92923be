/**
 * The closed form of one damped exponential in DFT bins, and its derivative.
 *
 * A line of unit amplitude, s = 2 pi i f - R, sampled at n0, n0 + 1, ... n0 + M - 1 and softly windowed from n0 on, is
 *   G_k = M^(-1/2) exp(s (n0 - tau) dt) (1 - z^M) / (1 - z u_k),   z = exp((s - kappa) dt),  u_k = exp(-2 pi i k / M),
 * a geometric sum (u_k^M = 1). Its derivative by s is
 *   dG_k/ds = G_k [(n0 - tau) dt - M dt z^M / (1 - z^M) + dt z u_k / (1 - z u_k)].
 * Reference: geometric series; checked against the direct sum in the test.
 */

/** The bins a line is evaluated on, and the sampling they come from. */
export interface BinGrid {
  /** (2 binCount) interleaved u_k = exp(-2 pi i k / M). */
  readonly rotation: Float64Array;
  readonly binCount: number;
  readonly sampleCount: number;
  readonly dwellSeconds: number;
  readonly softWindowPerSecond: number;
}

/** One damped exponential. */
export interface DampedLine {
  /** From the carrier. */
  frequencyHz: number;
  /** R, at least 0. */
  decayPerSecond: number;
  /** n0 - tau: samples from time zero to the first sample used, may be fractional. */
  leadSamples: number;
}

/** Lay a grid over the bins `firstBin` to `firstBin + binCount - 1` (taken modulo the sample count). */
export function createBinGrid(options: {
  firstBin: number;
  binCount: number;
  sampleCount: number;
  dwellSeconds: number;
  softWindowPerSecond: number;
}): BinGrid {
  const rotation = new Float64Array(2 * options.binCount);
  for (let k = 0; k < options.binCount; k += 1) {
    const angle = (-2 * Math.PI * (options.firstBin + k)) / options.sampleCount;
    rotation[2 * k] = Math.cos(angle);
    rotation[2 * k + 1] = Math.sin(angle);
  }
  return { ...options, rotation };
}

/**
 * Fill the response of one line and, where asked for, its derivative by s = 2 pi i f - R.
 *
 * @param value        (2 binCount) out, interleaved G_k
 * @param derivative   (2 binCount) out, interleaved dG_k/ds; undefined leaves it out
 * @param bins        which bins to fill; others stay as they are
 * @cost O(bins), no allocation
 */
export function lineResponseInto(
  grid: BinGrid,
  line: DampedLine,
  value: Float64Array,
  derivative: Float64Array | undefined,
  bins: { readonly start: number; readonly end: number } = { start: 0, end: grid.binCount },
): void {
  const { rotation, sampleCount, dwellSeconds } = grid;
  const { frequencyHz, decayPerSecond, leadSamples } = line;
  // z and z^M share the exponent (s - kappa) dt, real part `decay`, imaginary part `turn`.
  const decay = -(decayPerSecond + grid.softWindowPerSecond) * dwellSeconds;
  const turn = 2 * Math.PI * frequencyHz * dwellSeconds;
  const zSize = Math.exp(decay);
  const zRe = zSize * Math.cos(turn);
  const zIm = zSize * Math.sin(turn);
  const endSize = Math.exp(decay * sampleCount);
  const endRe = endSize * Math.cos(turn * sampleCount);
  const endIm = endSize * Math.sin(turn * sampleCount);
  const startSize = Math.exp(-decayPerSecond * leadSamples * dwellSeconds) / Math.sqrt(sampleCount);
  const startRe = startSize * Math.cos(turn * leadSamples);
  const startIm = startSize * Math.sin(turn * leadSamples);
  // c = start (1 - z^M)
  const cRe = startRe * (1 - endRe) + startIm * endIm;
  const cIm = startIm * (1 - endRe) - startRe * endIm;
  // b = lead dt - M dt z^M / (1 - z^M)
  const open = 1 / ((1 - endRe) * (1 - endRe) + endIm * endIm);
  const ratioRe = (endRe * (1 - endRe) - endIm * endIm) * open;
  const ratioIm = endIm * open;
  const bRe = leadSamples * dwellSeconds - sampleCount * dwellSeconds * ratioRe;
  const bIm = -sampleCount * dwellSeconds * ratioIm;
  for (let k = bins.start; k < bins.end; k += 1) {
    const uRe = rotation[2 * k];
    const uIm = rotation[2 * k + 1];
    const zuRe = zRe * uRe - zIm * uIm;
    const zuIm = zRe * uIm + zIm * uRe;
    const dRe = 1 - zuRe;
    const inverse = 1 / (dRe * dRe + zuIm * zuIm);
    // 1 / (1 - zu)
    const pRe = dRe * inverse;
    const pIm = zuIm * inverse;
    const gRe = cRe * pRe - cIm * pIm;
    const gIm = cRe * pIm + cIm * pRe;
    value[2 * k] = gRe;
    value[2 * k + 1] = gIm;
    if (derivative !== undefined) {
      const slopeRe = bRe + dwellSeconds * (zuRe * pRe - zuIm * pIm);
      const slopeIm = bIm + dwellSeconds * (zuRe * pIm + zuIm * pRe);
      derivative[2 * k] = gRe * slopeRe - gIm * slopeIm;
      derivative[2 * k + 1] = gRe * slopeIm + gIm * slopeRe;
    }
  }
}
