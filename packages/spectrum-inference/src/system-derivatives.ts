import { type DampedLine, lineResponseInto } from '@spinassay/signal-processing';
import type { BinWindow, BinWindows } from './bin-windows.ts';
import { addRotated, addScaled } from './column-sums.ts';
import type { SystemLines } from './compound-lines.ts';
import { decayOf, type SystemContext } from './system-context.ts';

/** Derivatives of a line are evaluated within this distance of it; tails move the baseline only. */
const DERIVATIVE_REACH_HZ = 25;

/** Response and slope of one line, (2 binCount) each. */
export interface Scratch {
  readonly value: Float64Array;
  readonly slope: Float64Array;
}

/** Add the derivatives of one spin system, times its amount, to the columns of every parameter that moves it. */
export function addSystemDerivatives(
  context: SystemContext,
  amount: number,
  bins: BinWindows,
  columns: readonly Float64Array[],
  scratch: Scratch,
): void {
  const { system, places, values, leadSamples } = context;
  const groupCount = system.system.groups.length;
  const line: DampedLine = { frequencyHz: 0, decayPerSecond: 0, leadSamples };
  for (let i = 0; i < system.isotopologues.length; i += 1) {
    const table = system.linesWithDerivatives(i, context);
    const share = system.isotopologues[i].weight * system.system.copyCount * amount;
    for (let l = 0; l < table.lineCount; l += 1) {
      line.frequencyHz = table.frequencyHz[l];
      for (let g = 0; g < groupCount; g += 1) {
        const weight = table.groupWeight[l * groupCount + g] * share;
        const response = values[places.response + g];
        if (Math.abs(weight) < bins.lineWeightMin * Math.abs(amount)) continue;
        line.decayPerSecond = decayOf(context, g, line.frequencyHz);
        const slope = { table, l, g, share: share * response, weight: weight * response, line, amount, response };
        for (const window of bins.windows) {
          const stretch = stretchNear(window, bins, line.frequencyHz);
          if (stretch.start >= stretch.end) continue;
          lineResponseInto(window.grid, line, scratch.value, scratch.slope, stretch);
          addLineSlopes(context, slope, { window, stretch, ...scratch }, columns);
        }
      }
    }
  }
}

/** The bins of a window within reach of a line; soft lines reach further. */
function stretchNear(window: BinWindow, bins: BinWindows, frequencyHz: number): { start: number; end: number } {
  const reach = DERIVATIVE_REACH_HZ + window.grid.softWindowPerSecond;
  const place = (hz: number): number => Math.ceil(hz / bins.binSpacingHz) - window.firstBin;
  return {
    start: Math.max(0, place(frequencyHz - reach)),
    end: Math.min(window.grid.binCount, place(frequencyHz + reach)),
  };
}

interface LineSlope {
  readonly table: ReturnType<SystemLines['linesWithDerivatives']>;
  readonly l: number;
  readonly g: number;
  /** Amount times copies, isotopologue and response. */
  readonly share: number;
  /** The line's weight times share. */
  readonly weight: number;
  readonly response: number;
  readonly line: DampedLine;
  readonly amount: number;
}

interface EvaluatedStretch extends Scratch {
  readonly window: BinWindow;
  readonly stretch: { readonly start: number; readonly end: number };
}

/** Add one line's share to the derivative columns of everything that moves, widens or reweights it. */
function addLineSlopes(
  context: SystemContext,
  { table, l, g, share, weight, response, line, amount }: LineSlope,
  { window, stretch, value, slope }: EvaluatedStretch,
  columns: readonly Float64Array[],
): void {
  const { system, places, values, layout, field, lineWeightMin } = context;
  const groupCount = system.system.groups.length;
  const derivativeCount = groupCount + system.system.couplings.length;
  const turn = 2 * Math.PI;
  const negligible = lineWeightMin * Math.abs(amount);
  const from = 2 * stretch.start;
  const to = 2 * stretch.end;
  const at = 2 * window.offset;
  const add = (place: number, column: Float64Array, factor: number): void =>
    addScaled(columns[place], at, column, from, to, factor);
  const addTurned = (place: number, column: Float64Array, factor: number): void =>
    addRotated(columns[place], at, column, from, to, factor);
  for (let p = 0; p < derivativeCount; p += 1) {
    const isShift = p < groupCount;
    if (isShift && places.shift < 0) continue;
    const chain = isShift ? layout.hertzPerPpm : 1;
    const place = isShift ? places.shift + p : places.coupling + p - groupCount;
    const weightSlope = table.groupWeightDerivative[(l * groupCount + g) * derivativeCount + p] * share * chain;
    const frequencySlope = table.frequencyDerivative[l * derivativeCount + p] * weight * chain * turn;
    if (Math.abs(weightSlope) > negligible * chain) add(place, value, weightSlope);
    if (Math.abs(frequencySlope) > negligible * chain) addTurned(place, slope, frequencySlope);
  }
  if (layout.referencePosition >= 0) addTurned(layout.referencePosition, slope, weight * turn);
  if (places.shift >= 0) addTurned(layout.commonOffset, slope, weight * turn * layout.hertzPerPpm);
  add(places.logDecay + g, slope, -weight * Math.exp(values[places.logDecay + g]));
  if (layout.intensityBroadening >= 0) add(layout.intensityBroadening, slope, -weight * field(line.frequencyHz));
  add(places.response + g, value, weight / response);
  addTurned(layout.phase, value, weight);
  // d/d tau of exp(s (n0 - tau) dt) is -s dt, s = 2 pi i f - R.
  const dwell = window.grid.dwellSeconds;
  add(layout.timeZero, value, weight * dwell * line.decayPerSecond);
  addTurned(layout.timeZero, value, -weight * dwell * turn * line.frequencyHz);
}
