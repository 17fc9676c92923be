import type { CompoundAnswer, Estimate, SpectrumAnswer } from '@spinassay/spectrum-inference';
import { describe, expect, it } from 'vitest';
import { judgePresence } from './judge-presence.ts';

const estimate = (value: number): Estimate => ({ value, sd: 0.01, low95: value - 0.02, high95: value + 0.02 });

/** A compound of two groups at 1 and 2 ppm that looks as it should, changed where a case says so. */
function compound(
  change: Partial<CompoundAnswer> & { ratios?: [number, number]; pullSd?: number } = {},
): CompoundAnswer {
  const { ratios = [1, 1], pullSd = 0.5, ...rest } = change;
  return {
    id: 'analyte',
    logBayesFactor: 100,
    amountPriorSd: 1000,
    amount: estimate(5),
    amountOverReference: estimate(1),
    upperLimit: undefined,
    upperLimitOverReference: undefined,
    spinSystems: [
      {
        label: 'chain',
        groups: ratios.map((ratio, g) => ({
          label: `H${g}`,
          protonCount: 1,
          shiftPpm: estimate(g + 1),
          shiftPullSd: pullSd,
          linewidthHz: estimate(1),
          ratio: estimate(ratio),
        })),
        couplings: [],
        exchangeable: [],
      },
    ],
    ...rest,
  };
}

function answer(residualFraction: number, reducedChiSquare = 1e4): Pick<SpectrumAnswer, 'windows'> {
  const window = { lowPpm: 0.9, highPpm: 1.1, binCount: 100, baselineTermCount: 3, residualFraction, reducedChiSquare };
  return { windows: [window] };
}

const judged = (found: CompoundAnswer, at = answer(0.01)): string => judgePresence(found, at as SpectrumAnswer, 0.05);

describe('judgePresence', () => {
  it('supports a compound that stands out and looks like itself', () => {
    expect(judged(compound())).toBe('supported');
  });

  it('does not support what the evidence speaks against, or what came out negative', () => {
    expect(judged(compound({ logBayesFactor: -1 }))).toBe('not-supported');
    expect(judged(compound({ amount: estimate(-5) }))).toBe('not-supported');
  });

  it('cannot tell when evidence is weak, a group disagrees, a shift is far, or the window is not explained', () => {
    expect(judged(compound({ logBayesFactor: 3 }))).toBe('cannot-tell');
    expect(judged(compound({ ratios: [0.8, 1.2] }))).toBe('cannot-tell');
    expect(judged(compound({ pullSd: 4 }))).toBe('cannot-tell');
    expect(judged(compound(), answer(0.2))).toBe('cannot-tell');
  });

  it('takes a residual of the size of the noise for what it is', () => {
    expect(judged(compound(), answer(0.2, 1.1))).toBe('supported');
  });
});
