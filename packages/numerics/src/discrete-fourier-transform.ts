import FFT from 'fft.js';
import { DimensionError } from './errors.ts';

/** A transform of one length with its tables; not shared between threads: it owns scratch. */
export interface FourierPlan {
  readonly size: number;
  /** Y_k = sum_n y_n exp(-2 pi i k n / N), not scaled: (2 N) interleaved in, unchanged; (2 N) interleaved out, new. */
  transform(signal: Float64Array): Float64Array;
}

/**
 * Prepare the discrete Fourier transform of any length.
 *
 * Powers of two go to the library; other lengths become a convolution of the next power of two above 2 N - 1.
 *
 * @param size N, complex samples
 * @throws DimensionError when the size is no positive whole number, or a signal has another length
 * @source Bluestein, IEEE Trans. Audio Electroacoust. 18 (1970) 451
 */
export function createFourierPlan(size: number): FourierPlan {
  if (!Number.isInteger(size) || size < 1) {
    throw new DimensionError(`expected an interleaved complex signal of at least one sample, got ${size} samples`);
  }
  const transform = size === 1 ? copy : isPowerOfTwo(size) ? powerOfTwoTransform(size) : chirpTransform(size);
  return {
    size,
    transform(signal) {
      if (signal.length !== 2 * size) throw new DimensionError(`expected ${2 * size} reals, got ${signal.length}`);
      return transform(signal);
    },
  };
}

/** The transform of one signal; see createFourierPlan, which serves many of one length. */
export function discreteFourierTransform(signal: Float64Array): Float64Array {
  return createFourierPlan(signal.length / 2).transform(signal);
}

type Transform = (signal: Float64Array) => Float64Array;

function copy(signal: Float64Array): Float64Array {
  return signal.slice();
}

function isPowerOfTwo(size: number): boolean {
  return (size & (size - 1)) === 0;
}

function powerOfTwoTransform(size: number): Transform {
  const fft = new FFT(size);
  const output = fft.createComplexArray();
  return (signal) => {
    fft.transform(output, signal);
    return Float64Array.from(output);
  };
}

function chirpTransform(size: number): Transform {
  let padded = 2;
  while (padded < 2 * size - 1) padded *= 2;
  const chirp = chirpTable(size);
  const fft = new FFT(padded);
  const kernel = kernelSpectrum(fft, chirp, padded);
  const input = new Array<number>(2 * padded).fill(0);
  const spectrum = fft.createComplexArray();
  return (signal) => {
    for (let n = 0; n < size; n += 1) {
      const cos = chirp[2 * n];
      const sin = chirp[2 * n + 1];
      input[2 * n] = signal[2 * n] * cos - signal[2 * n + 1] * sin;
      input[2 * n + 1] = signal[2 * n] * sin + signal[2 * n + 1] * cos;
    }
    input.fill(0, 2 * size);
    fft.transform(spectrum, input);
    multiplyInPlace(spectrum, kernel);
    fft.inverseTransform(input, spectrum);
    const output = new Float64Array(2 * size);
    for (let k = 0; k < size; k += 1) {
      output[2 * k] = input[2 * k] * chirp[2 * k] - input[2 * k + 1] * chirp[2 * k + 1];
      output[2 * k + 1] = input[2 * k] * chirp[2 * k + 1] + input[2 * k + 1] * chirp[2 * k];
    }
    return output;
  };
}

/** Transform of the conjugate chirp, laid out both ways round for the circular convolution. */
function kernelSpectrum(fft: FFT, chirp: Float64Array, padded: number): number[] {
  const kernel = new Array<number>(2 * padded).fill(0);
  for (let n = 0; n < chirp.length / 2; n += 1) {
    for (const place of n === 0 ? [0] : [n, padded - n]) {
      kernel[2 * place] = chirp[2 * n];
      kernel[2 * place + 1] = -chirp[2 * n + 1];
    }
  }
  const spectrum = fft.createComplexArray();
  fft.transform(spectrum, kernel);
  return spectrum;
}

/** exp(-pi i n^2 / N); n^2 is taken modulo 2 N, where it is exact, before it becomes an angle. */
function chirpTable(size: number): Float64Array {
  const chirp = new Float64Array(2 * size);
  for (let n = 0; n < size; n += 1) {
    const angle = (-Math.PI * ((n * n) % (2 * size))) / size;
    chirp[2 * n] = Math.cos(angle);
    chirp[2 * n + 1] = Math.sin(angle);
  }
  return chirp;
}

function multiplyInPlace(a: number[], b: readonly number[]): void {
  for (let k = 0; k < a.length; k += 2) {
    const re = a[k] * b[k] - a[k + 1] * b[k + 1];
    a[k + 1] = a[k] * b[k + 1] + a[k + 1] * b[k];
    a[k] = re;
  }
}
