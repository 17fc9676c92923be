import type { SpectrumModel } from './spectrum-model.ts';

/**
 * The model as a FID, sample by sample from index 0 on.
 *
 * Each line is a recurrence restarted from its closed form every 256 samples, so that rounding does not grow.
 *
 * @param amounts (C) signal of one proton of each compound
 * @returns (2 sampleCount) interleaved
 */
export function modelSignal(
  model: SpectrumModel,
  values: Float64Array,
  amounts: Float64Array,
  sampling: { readonly sampleCount: number; readonly dwellSeconds: number },
): Float64Array {
  const signal = new Float64Array(2 * sampling.sampleCount);
  const phase = values[model.layout.phase];
  const timeZero = values[model.layout.timeZero];
  for (const line of model.dampedLines(values)) {
    addLine(
      signal,
      { ...line, amplitude: line.weight * amounts[line.compound], phase, timeZero },
      sampling.dwellSeconds,
    );
  }
  return signal;
}

const RESTART_SAMPLES = 256;

function addLine(
  signal: Float64Array,
  line: { frequencyHz: number; decayPerSecond: number; amplitude: number; phase: number; timeZero: number },
  dwellSeconds: number,
): void {
  const turn = 2 * Math.PI * line.frequencyHz * dwellSeconds;
  const shrink = Math.exp(-line.decayPerSecond * dwellSeconds);
  const stepRe = shrink * Math.cos(turn);
  const stepIm = shrink * Math.sin(turn);
  const sampleCount = signal.length / 2;
  for (let start = 0; start < sampleCount; start += RESTART_SAMPLES) {
    const size = line.amplitude * Math.exp(-line.decayPerSecond * dwellSeconds * (start - line.timeZero));
    const angle = turn * (start - line.timeZero) + line.phase;
    let re = size * Math.cos(angle);
    let im = size * Math.sin(angle);
    const end = Math.min(sampleCount, start + RESTART_SAMPLES);
    for (let n = start; n < end; n += 1) {
      signal[2 * n] += re;
      signal[2 * n + 1] += im;
      const next = re * stepRe - im * stepIm;
      im = re * stepIm + im * stepRe;
      re = next;
    }
  }
}
