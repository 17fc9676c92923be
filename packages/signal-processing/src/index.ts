export { binFrequencyHz, REALS_PER_COMPLEX } from './conventions.ts';
export { estimateNoise, type NoiseEstimate } from './estimate-noise.ts';
export { fourTermTaper } from './four-term-taper.ts';
export { legendreBaseline } from './legendre-baseline.ts';
export { type BinGrid, createBinGrid, type DampedLine, lineResponseInto } from './line-response.ts';
export { type SignalRegion, signalRegions } from './signal-regions.ts';
export { type SpectrumRequest, softWindowedSpectrum } from './soft-windowed-spectrum.ts';
export { type TaperedSpectrum, taperedSpectrum } from './tapered-spectrum.ts';
