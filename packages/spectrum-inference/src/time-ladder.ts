import type { FourierPlan } from '@spinassay/numerics';
import { softWindowedSpectrum } from '@spinassay/signal-processing';
import { type BinWindows, cutBinWindows, type WindowRange } from './bin-windows.ts';

/** The part of a FID that a likelihood may use. */
export interface UsableSignal {
  readonly samples: Float64Array;
  readonly dwellSeconds: number;
  /** max(0, floor(time zero)) + 16: the filter's transient is left out (REAL-DATA section 2). */
  readonly firstSampleIndex: number;
  /** Transform of everything from the first sample on. */
  readonly plan: FourierPlan;
}

/** Soft windows of a routine search, 1/s, widest first (INFERENCE, routine fits). */
export const ROUTINE_LADDER_PER_SECOND: readonly number[] = [100, 30, 10, 3, 1, 0];

/** A soft window leaves nothing worth transforming beyond this many of its time constants. */
const SOFT_SPAN = 6;

/** Lines left out, in protons: while softly windowed, at the end of the ladder, and for statistics (INFERENCE, search step 3). */
const SOFT_LINE_WEIGHT_MIN = 3e-4;
const SEARCH_LINE_WEIGHT_MIN = 3e-5;
const STATISTICS_LINE_WEIGHT_MIN = 3e-6;

/** In the search, lines further from a window than this are left to its baseline; statistics keep all. */
const SEARCH_VALUE_REACH_HZ = 100;

/** Weight below which lines are left out of a rung of the search. */
export function searchLineWeightMin(softWindowPerSecond: number): number {
  return softWindowPerSecond > 0 ? SOFT_LINE_WEIGHT_MIN : SEARCH_LINE_WEIGHT_MIN;
}

/** Samples that count under a soft window. */
export function usedSampleCount(signal: UsableSignal, softWindowPerSecond: number): number {
  const all = signal.samples.length / 2 - signal.firstSampleIndex;
  if (softWindowPerSecond === 0) return all;
  return Math.min(all, Math.ceil(SOFT_SPAN / (softWindowPerSecond * signal.dwellSeconds)));
}

/** The binned windows of one rung. */
export function rungBins(
  signal: UsableSignal,
  softWindowPerSecond: number,
  ranges: readonly WindowRange[],
  lineWeightMin = STATISTICS_LINE_WEIGHT_MIN,
): BinWindows {
  const sampling = {
    firstSampleIndex: signal.firstSampleIndex,
    sampleCount: usedSampleCount(signal, softWindowPerSecond),
    dwellSeconds: signal.dwellSeconds,
    softWindowPerSecond,
    lineWeightMin,
    valueReachHz: lineWeightMin > STATISTICS_LINE_WEIGHT_MIN ? SEARCH_VALUE_REACH_HZ : Number.POSITIVE_INFINITY,
  };
  const plan = sampling.sampleCount === signal.plan.size ? signal.plan : undefined;
  return cutBinWindows(softWindowedSpectrum(signal.samples, sampling, plan), sampling, ranges);
}
