import { describe, expect, it } from 'vitest';
import { nineProtonReference, threeMethylenes } from '../test-support/example-systems.ts';
import { type BinWindows, cutBinWindows } from './bin-windows.ts';
import { createParameterLayout, parameterValues } from './parameter-layout.ts';
import { createSpectrumModel } from './spectrum-model.ts';

const SILICON = [{ groupIndex: 0, couplingHz: 6.6, abundanceFraction: 0.0467 }];
const layout = createParameterLayout(
  {
    compounds: [{ id: 'chain', spinSystems: [threeMethylenes()] }],
    reference: nineProtonReference(SILICON),
    commonOffsetSdPpm: 0.05,
    carrierPpm: 2,
    hertzPerPpm: 400,
  },
  {
    referencePositionHz: { mean: -800, sd: 1 },
    phaseRadians: { mean: 0.4, sd: 0.1 },
    timeZeroSamples: { mean: 0.1, sd: 0.05 },
    logDecay: { mean: Math.log(4), sd: 0.3 },
    withIntensityBroadening: false,
  },
);
const sampling = {
  sampleCount: 4000,
  dwellSeconds: 1 / 2500,
  firstSampleIndex: 16,
  softWindowPerSecond: 0,
  lineWeightMin: 1e-7,
  valueReachHz: 1e9,
};
const bins: BinWindows = cutBinWindows(
  new Float64Array(2 * sampling.sampleCount),
  sampling,
  [-800, -40, 120, 400].map((centre) => ({ lowHz: centre - 20, highHz: centre + 20, baselineTermCount: 0 })),
);
const amounts = Float64Array.of(2, 3);
const model = createSpectrumModel(layout);
const start = parameterValues(
  layout,
  Float64Array.from(layout.parameters, (_, p) => 0.3 * Math.sin(p)),
);

function total(values: Float64Array): Float64Array {
  const columns = layout.compounds.map(() => new Float64Array(2 * bins.binCount));
  model.compoundColumnsInto(values, bins, columns);
  return columns[0].map((value, k) => amounts[0] * value + amounts[1] * columns[1][k]);
}

describe('createSpectrumModel', () => {
  it('has the derivatives that central differences show, for every kind of parameter', () => {
    const columns = layout.parameters.map(() => new Float64Array(2 * bins.binCount));
    model.derivativeColumnsInto(start, amounts, bins, columns);
    layout.parameters.forEach(({ kind, unit }, p) => {
      const step = 1e-5 * Math.max(unit, 1e-3);
      const moved = (sign: number): Float64Array =>
        total(start.map((value, q) => (q === p ? value + sign * step : value)));
      const [up, down] = [moved(1), moved(-1)];
      let error = 0;
      let size = 0;
      columns[p].forEach((value, k) => {
        const difference = (up[k] - down[k]) / (2 * step);
        error = Math.max(error, Math.abs(value - difference));
        size = Math.max(size, Math.abs(difference));
      });
      // Tails beyond 25 Hz are left out. A line of decay R has fallen there to R / (2 pi 25 Hz) = 2.5 % of its peak, its slope
      // to the square of that; couplings move weights as well as places. A group has a few lines, hence twice as much.
      const isValueLike = ['response', 'phase', 'time-zero', 'coupling'].includes(kind);
      expect(error / size, `${kind} ${p}`).toBeLessThan(isValueLike ? 0.05 : 0.002);
    });
  });

  it('puts the protons of each compound into its column, satellites or not', () => {
    const lines = model.dampedLines(start);
    const weightOf = (compound: number): number =>
      lines.filter((line) => line.compound === compound).reduce((sum, line) => sum + line.weight, 0);
    const response = (compound: number, groups: number): number[] =>
      Array.from({ length: groups }, (_, g) => start[layout.places[compound][0].response + g]);
    expect(weightOf(0)).toBeCloseTo(9 * response(0, 1)[0], 5);
    expect(weightOf(1)).toBeCloseTo(2 * response(1, 3).reduce((sum, r) => sum + r, 0), 4);
  });
});
