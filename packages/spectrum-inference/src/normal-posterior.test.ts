import { describe, expect, it } from 'vitest';
import { type BinWindows, cutBinWindows } from './bin-windows.ts';
import type { LinearisedFit } from './linearised-fit.ts';
import { gramSystem, normalPosterior } from './normal-posterior.ts';
import { createParameterLayout } from './parameter-layout.ts';
import { ENVELOPE_COLUMN_COUNT } from './shared-envelope.ts';

/** One window of as many bins as there are data, without a baseline; its grid is not used here. */
function plainBins(data: readonly number[]): BinWindows {
  const sampling = {
    sampleCount: 64,
    dwellSeconds: 1 / 64,
    firstSampleIndex: 0,
    softWindowPerSecond: 0,
    lineWeightMin: 0,
    valueReachHz: 1e9,
  };
  const bins = cutBinWindows(new Float64Array(128), sampling, [
    { lowHz: 0, highHz: data.length - 0.5, baselineTermCount: 0 },
  ]);
  return { ...bins, data: Float64Array.from(data.flatMap((value) => [value, 0])) };
}

/** A model whose amounts are the weights of given columns and which has no other parameter that matters. */
function linearFit(data: readonly number[], columns: readonly (readonly number[])[]): LinearisedFit {
  const bins = plainBins(data);
  const compounds = columns.map((_, c) => ({ id: `column ${c}`, spinSystems: [] }));
  const fixed = { mean: 0, sd: 0 };
  const layout = createParameterLayout(
    { compounds, reference: undefined, commonOffsetSdPpm: 0, carrierPpm: 0, hertzPerPpm: 500 },
    {
      referencePositionHz: fixed,
      phaseRadians: fixed,
      timeZeroSamples: fixed,
      logDecay: fixed,
      withIntensityBroadening: false,
    },
  );
  const zero = (): Float64Array => new Float64Array(2 * data.length);
  return {
    layout,
    bins,
    standardised: new Float64Array(layout.parameters.length),
    amounts: new Float64Array(columns.length),
    envelope: new Float64Array(ENVELOPE_COLUMN_COUNT),
    residual: bins.data,
    columns: [
      ...layout.parameters.map(zero),
      ...columns.map((column) => Float64Array.from(column.flatMap((value) => [value, 0]))),
      ...Array.from({ length: ENVELOPE_COLUMN_COUNT }, zero),
    ],
  };
}

/** The evidence of real data: ours is that of both components of complex bins, and leaves out powers of 2 pi. */
function evidenceOf(count: number, sd: number, logEvidence: number): number {
  return logEvidence + count * Math.log(sd) - (count / 2) * Math.log(2 * Math.PI);
}

// REFERENCE section 5: y at x = 0..5, noise sd 0.5, prior N(0, 4) on intercept and slope (Bishop 2006 eq. 3.49-3.51).
const Y = [1.1, 2.9, 5.2, 6.8, 9.1, 10.8];
const ONE = Y.map(() => 1);
const X = Y.map((_, i) => i);
const SD = 0.5;

function posteriorOf(fit: LinearisedFit, without: readonly number[] = []): ReturnType<typeof normalPosterior> {
  const noise = { noiseSd: SD, localModel: new Float64Array(Y.length) };
  const amountSd = new Float64Array(fit.amounts.length).fill(2);
  return normalPosterior(fit, gramSystem(fit, noise, 0), { amountSd, envelopeSd: 0, without });
}

describe('normalPosterior', () => {
  it('has the mean, sd and evidence of the published straight line', () => {
    const { step, factor, logEvidence } = posteriorOf(linearFit(Y, [ONE, X]));
    expect(step[0]).toBeCloseTo(1.0590659, 6);
    expect(step[1]).toBeCloseTo(1.9652942, 6);
    // Last diagonal of the Cholesky factor of the precision is 1 / sd of the last variable.
    expect(1 / factor[3]).toBeCloseTo(0.1180181, 6);
    expect(evidenceOf(6, SD, logEvidence)).toBeCloseTo(-7.3452174, 6);
  });

  it('has the published evidence of a constant alone, and the published Bayes factor when the slope is left out', () => {
    const line = linearFit(Y, [ONE, X]);
    const alone = posteriorOf(linearFit(Y, [ONE]));
    expect(evidenceOf(6, SD, alone.logEvidence)).toBeCloseTo(-143.1676707, 6);
    expect(posteriorOf(line).logEvidence - posteriorOf(line, [1]).logEvidence).toBeCloseTo(135.8224532, 6);
  });

  it('gives the same wherever it is linearised', () => {
    const plain = linearFit(Y, [ONE, X]);
    const amounts = Float64Array.of(3, -1);
    const residual = plain.residual.map((value, k) => value - (k % 2 === 0 ? 3 - k / 2 : 0));
    const moved = { ...plain, amounts, residual };
    expect(posteriorOf(moved).logEvidence).toBeCloseTo(posteriorOf(plain).logEvidence, 9);
    expect(posteriorOf(moved, [1]).logEvidence).toBeCloseTo(posteriorOf(plain, [1]).logEvidence, 9);
    expect(posteriorOf(moved).step[0] + 3).toBeCloseTo(posteriorOf(plain).step[0], 9);
  });
});
