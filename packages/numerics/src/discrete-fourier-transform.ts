import FFT from 'fft.js';
import { DimensionError } from './errors.ts';

/**
 * Discrete Fourier transform of any length: Y_k = sum_n y_n exp(-2 pi i k n / N), not scaled.
 *
 * Powers of two go to the library; other lengths become a convolution of the next power of two above 2 N - 1.
 *
 * @param signal (2 N) interleaved, unchanged
 * @returns (2 N) interleaved
 * @throws DimensionError when the length is odd or zero
 * @source Bluestein, IEEE Trans. Audio Electroacoust. 18 (1970) 451
 */
export function discreteFourierTransform(signal: Float64Array): Float64Array {
  if (signal.length === 0 || signal.length % 2 === 1) {
    throw new DimensionError(`expected an interleaved complex signal, got ${signal.length} reals`);
  }
  const size = signal.length / 2;
  if (size === 1) return signal.slice();
  return isPowerOfTwo(size) ? powerOfTwoTransform(signal, size) : chirpTransform(signal, size);
}

function isPowerOfTwo(size: number): boolean {
  return (size & (size - 1)) === 0;
}

function powerOfTwoTransform(signal: Float64Array, size: number): Float64Array {
  const fft = new FFT(size);
  const output = fft.createComplexArray();
  fft.transform(output, signal);
  return Float64Array.from(output);
}

function chirpTransform(signal: Float64Array, size: number): Float64Array {
  let padded = 2;
  while (padded < 2 * size - 1) padded *= 2;
  const chirp = chirpTable(size);
  const fft = new FFT(padded);
  const input = new Array<number>(2 * padded).fill(0);
  const kernel = new Array<number>(2 * padded).fill(0);
  for (let n = 0; n < size; n += 1) {
    const cos = chirp[2 * n];
    const sin = chirp[2 * n + 1];
    input[2 * n] = signal[2 * n] * cos - signal[2 * n + 1] * sin;
    input[2 * n + 1] = signal[2 * n] * sin + signal[2 * n + 1] * cos;
    kernel[2 * n] = cos;
    kernel[2 * n + 1] = -sin;
    if (n > 0) {
      kernel[2 * (padded - n)] = cos;
      kernel[2 * (padded - n) + 1] = -sin;
    }
  }
  const product = fft.createComplexArray();
  const spectrum = fft.createComplexArray();
  fft.transform(product, input);
  fft.transform(spectrum, kernel);
  multiplyInPlace(product, spectrum);
  fft.inverseTransform(spectrum, product);
  const output = new Float64Array(2 * size);
  for (let k = 0; k < size; k += 1) {
    output[2 * k] = spectrum[2 * k] * chirp[2 * k] - spectrum[2 * k + 1] * chirp[2 * k + 1];
    output[2 * k + 1] = spectrum[2 * k] * chirp[2 * k + 1] + spectrum[2 * k + 1] * chirp[2 * k];
  }
  return output;
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
