declare module 'fft.js' {
  /** Complex FFT of one power-of-two size; buffers interleave re, im. Forward kernel exp(-2 pi i k n / size). */
  export default class FFT {
    constructor(size: number);
    createComplexArray(): number[];
    transform(output: number[], input: number[] | Float64Array): void;
    inverseTransform(output: number[], input: number[]): void;
  }
}
