import type { BinWindows } from './bin-windows.ts';
import { type ClimbReport, climb } from './levenberg-marquardt.ts';
import { createWhiteWhitener, type NoiseWhitener } from './noise-whitener.ts';
import { parameterValues, priorPrecision } from './parameter-layout.ts';
import { dot, evaluateFit, type FitPoint, type FitTarget } from './spectrum-fit.ts';
import type { SpectrumModel } from './spectrum-model.ts';
import type { UsableSignal } from './time-ladder.ts';

/** What a rung needs besides its bins. */
export interface RungContext {
  readonly model: SpectrumModel;
  readonly noiseSd: number;
  readonly amountSd: Float64Array;
  readonly signal: UsableSignal;
}

export interface RungResult {
  readonly standardised: Float64Array;
  readonly amounts: Float64Array;
  /** Negative log posterior with the noise of each window profiled out, nats: comparable between members of a rung. */
  readonly score: number;
  readonly evaluationCount: number;
}

/** Model error assumed at the start of a rung, as a share of the window's rms (REAL-DATA step 5). */
const START_MODEL_ERROR = 0.1;
/** Lineshape error assumed for response factors while searching. */
const SEARCH_EPS = 0.05;
/** Iterations with the first and with the re-estimated noise (INFERENCE, search step 3). */
const FIRST_ITERATIONS = 8;
const SECOND_ITERATIONS = 4;
const GAIN_MIN = 0.01;

/**
 * Fit one rung of the ladder. The residual's rms in each window stands in for the noise, re-estimated twice: with the true
 * noise the priors would be ignored and wrong modes win (REAL-DATA finding 5).
 */
export function fitRung(context: RungContext, bins: BinWindows, start: Float64Array): RungResult {
  const precision = priorPrecision(context.model.layout, SEARCH_EPS);
  const target = (whitener: NoiseWhitener): FitTarget => ({
    model: context.model,
    bins,
    whitener,
    precision,
    amountSd: context.amountSd,
  });
  const flat = createWhiteWhitener(bins, new Float64Array(bins.windows.length).fill(1));
  const first = windowNoise(bins, withoutBaseline(bins, flat), context.noiseSd, START_MODEL_ERROR);
  let report: ClimbReport = climb(target(createWhiteWhitener(bins, first)), start, {
    iterationsMax: FIRST_ITERATIONS,
    gainMin: GAIN_MIN,
  });
  let evaluationCount = report.evaluationCount;
  let noise = first;
  for (let pass = 0; pass < 2; pass += 1) {
    noise = windowNoise(bins, unwhiten(bins, report.point.residual, noise), context.noiseSd, 1);
    report = climb(target(createWhiteWhitener(bins, noise)), report.point.standardised, {
      iterationsMax: SECOND_ITERATIONS,
      gainMin: GAIN_MIN,
    });
    evaluationCount += report.evaluationCount;
  }
  const { standardised, amounts } = report.point;
  const score = profileScore(bins, unwhiten(bins, report.point.residual, noise), context, precision, report.point);
  return { standardised, amounts, score, evaluationCount };
}

/** Score of a place on some bins without climbing: amounts at their best, the noise of each window profiled out. */
export function scoreOnBins(context: RungContext, bins: BinWindows, standardised: Float64Array): number {
  const precision = priorPrecision(context.model.layout, SEARCH_EPS);
  const even = new Float64Array(bins.windows.length).fill(context.noiseSd);
  const { model, amountSd } = context;
  const point = evaluateFit(
    { model, bins, whitener: createWhiteWhitener(bins, even), precision, amountSd },
    standardised,
  );
  return profileScore(bins, unwhiten(bins, point.residual, even), context, precision, point);
}

/** Turn the phase so that the strongest compound's complex amplitude is real and positive; for searches without a phase prior. */
export function alignPhase(context: RungContext, bins: BinWindows, start: Float64Array): Float64Array {
  const { layout } = context.model;
  const flat = createWhiteWhitener(bins, new Float64Array(bins.windows.length).fill(1));
  const target = {
    model: context.model,
    bins,
    whitener: flat,
    precision: priorPrecision(layout, SEARCH_EPS),
    amountSd: context.amountSd,
  };
  const { compoundColumns } = evaluateFit(target, start);
  const data = withoutBaseline(bins, flat);
  let best = 0;
  let angle = 0;
  for (const column of compoundColumns) {
    let re = 0;
    let im = 0;
    for (let k = 0; k < data.length; k += 2) {
      re += column[k] * data[k] + column[k + 1] * data[k + 1];
      im += column[k] * data[k + 1] - column[k + 1] * data[k];
    }
    const explained = (re * re + im * im) / dot(column, column);
    if (explained > best) {
      best = explained;
      angle = Math.atan2(im, re);
    }
  }
  const aligned = start.slice();
  const { mean, unit } = layout.parameters[layout.phase];
  const phase = parameterValues(layout, start)[layout.phase] + angle;
  aligned[layout.phase] = (Math.atan2(Math.sin(phase - mean), Math.cos(phase - mean)) || 0) / unit;
  return aligned;
}

function withoutBaseline(bins: BinWindows, flat: NoiseWhitener): Float64Array {
  const data = bins.data.slice();
  flat.whitenInPlace(data);
  return data;
}

/** sqrt(sigma^2 + share^2 mean|column|^2 per component) of each window. */
function windowNoise(bins: BinWindows, column: Float64Array, noiseSd: number, share: number): Float64Array {
  return Float64Array.from(bins.windows, (window) => {
    const square = windowSquare(column, window.offset, window.grid.binCount);
    const freedom = Math.max(1, 2 * (window.grid.binCount - window.baselineTermCount));
    return Math.sqrt(noiseSd * noiseSd + (share * share * square) / freedom);
  });
}

function unwhiten(bins: BinWindows, residual: Float64Array, noise: Float64Array): Float64Array {
  const column = residual.slice();
  bins.windows.forEach((window, w) => {
    for (let k = 2 * window.offset; k < 2 * (window.offset + window.grid.binCount); k += 1) column[k] *= noise[w];
  });
  return column;
}

function profileScore(
  bins: BinWindows,
  residual: Float64Array,
  { noiseSd }: RungContext,
  precision: Float64Array,
  point: FitPoint,
): number {
  let score = 0;
  for (const window of bins.windows) {
    const freedom = Math.max(1, 2 * (window.grid.binCount - window.baselineTermCount));
    const variance = Math.max(noiseSd * noiseSd, windowSquare(residual, window.offset, window.grid.binCount) / freedom);
    score += 0.5 * freedom * Math.log(variance / (noiseSd * noiseSd));
    score += 0.5 * (windowSquare(residual, window.offset, window.grid.binCount) / variance);
  }
  point.standardised.forEach((t, p) => {
    score += t === 0 ? 0 : 0.5 * precision[p] * t * t;
  });
  return score;
}

function windowSquare(column: Float64Array, offset: number, binCount: number): number {
  let square = 0;
  for (let k = 2 * offset; k < 2 * (offset + binCount); k += 1) square += column[k] * column[k];
  return square;
}
