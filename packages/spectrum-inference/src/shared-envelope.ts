import { softWindowedSpectrum } from '@spinassay/signal-processing';
import { type BinWindows, pickBins } from './bin-windows.ts';
import { modelSignal } from './model-signal.ts';
import type { SpectrumModel } from './spectrum-model.ts';
import type { UsableSignal } from './time-ladder.ts';

/**
 * One complex envelope shared by all lines: what shim and drift do to a spectrum, on the side of the model.
 *
 *   e(t) = 1 + sum_k (u_k + i v_k) (1 - cos(pi k sqrt(t / T))),  k = 1 ... 8, T the length of the signal,
 *
 * linear in u and v: each is a column, the model FID times its shape. It is 1 at time zero, so amounts keep their meaning.
 *
 * @source INTERVALS section 2, row E; REAL-DATA step 9 (8 terms: chi-square falls 27 times on a measured ester)
 */
export const ENVELOPE_TERM_COUNT = 8;
/** A real and an imaginary weight for each term. */
export const ENVELOPE_COLUMN_COUNT = 2 * ENVELOPE_TERM_COUNT;

/** Columns of the envelope: u_1 ... u_8, then v_1 ... v_8, each (2 binCount). */
export function envelopeColumns(
  model: SpectrumModel,
  at: { readonly values: Float64Array; readonly amounts: Float64Array },
  signal: UsableSignal,
  bins: BinWindows,
): Float64Array[] {
  const sampleCount = signal.samples.length / 2;
  const whole = modelSignal(model, at.values, at.amounts, { sampleCount, dwellSeconds: signal.dwellSeconds });
  const timeZero = at.values[model.layout.timeZero];
  const real = Array.from({ length: ENVELOPE_TERM_COUNT }, (_, k) => {
    const shaped = whole.map((value, i) => value * envelopeShape(k + 1, Math.floor(i / 2) - timeZero, sampleCount));
    const request = { ...signal, sampleCount: sampleCount - signal.firstSampleIndex, softWindowPerSecond: 0 };
    const spectrum = softWindowedSpectrum(shaped, request, signal.plan);
    return pickBins(bins, spectrum);
  });
  return [...real, ...real.map(timesImaginaryUnit)];
}

/** A model FID under the envelope with weights u_k, then v_k; in place, sample 0 at index 0. */
export function applyEnvelopeInPlace(signal: Float64Array, weights: Float64Array, timeZeroSamples: number): void {
  const sampleCount = signal.length / 2;
  for (let n = 0; n < sampleCount; n += 1) {
    let re = 1;
    let im = 0;
    for (let k = 0; k < ENVELOPE_TERM_COUNT; k += 1) {
      const shape = envelopeShape(k + 1, n - timeZeroSamples, sampleCount);
      re += weights[k] * shape;
      im += weights[ENVELOPE_TERM_COUNT + k] * shape;
    }
    const value = signal[2 * n];
    signal[2 * n] = value * re - signal[2 * n + 1] * im;
    signal[2 * n + 1] = value * im + signal[2 * n + 1] * re;
  }
}

function envelopeShape(k: number, samplesAfterZero: number, sampleCount: number): number {
  return 1 - Math.cos(Math.PI * k * Math.sqrt(Math.max(0, samplesAfterZero) / sampleCount));
}

function timesImaginaryUnit(column: Float64Array): Float64Array {
  const turned = new Float64Array(column.length);
  for (let k = 0; k < column.length; k += 2) {
    turned[k] = -column[k + 1];
    turned[k + 1] = column[k];
  }
  return turned;
}
