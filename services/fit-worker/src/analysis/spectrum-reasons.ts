import type { SpectrumAnswer } from '@spinassay/spectrum-inference';
import { ALL_CLAIMS, type Holding } from './judge.ts';
import { isNoise } from './judge-presence.ts';

/** What keeps the model from explaining the spectrum, heaviest first; empty when it does. */
export function spectrumReasons(answer: SpectrumAnswer, residualFractionMax: number): Holding[] {
  return [
    ...broadening(answer),
    ...largeResiduals(answer, residualFractionMax),
    ...unexplained(answer),
    ...searchDoubts(answer),
  ];
}

function broadening({ intensityBroadening: found }: SpectrumAnswer): Holding[] {
  if (!found?.isNoticed) return [];
  return [
    {
      holds: ALL_CLAIMS,
      reason: {
        code: 'line-widths-grow-with-intensity',
        detail: `Line widths grow with line intensity: the strongest line decays ${percent(found.excessFraction)} faster than the common rate. This is how radiation damping in a concentrated sample shows; the model does not hold it, and shifts, couplings and areas would be biased. Dilute the sample or detune the probe and measure again.`,
        facts: {
          excessDecayPerSecond: found.excessPerSecond,
          excessDecaySdPerSecond: found.excessSd,
          excessFraction: found.excessFraction,
          logEvidenceGain: found.logEvidenceGain,
        },
      },
    },
  ];
}

function largeResiduals({ windows }: SpectrumAnswer, residualFractionMax: number): Holding[] {
  const poor = windows.filter((w) => w.residualFraction > residualFractionMax && !isNoise(w.reducedChiSquare));
  if (poor.length === 0) return [];
  const worst = poor.reduce((a, b) => (b.residualFraction > a.residualFraction ? b : a));
  return [
    {
      holds: ALL_CLAIMS,
      reason: {
        code: 'residual-too-large',
        detail: `The model leaves ${percent(worst.residualFraction)} of the signal unexplained between ${worst.lowPpm.toFixed(3)} and ${worst.highPpm.toFixed(3)} ppm; the method allows ${percent(residualFractionMax)}.`,
        regionsPpm: poor.map(({ lowPpm, highPpm }) => ({ lowPpm, highPpm })),
      },
    },
  ];
}

function unexplained({ unexplained: regions }: SpectrumAnswer): Holding[] {
  if (regions.length === 0) return [];
  const places = regions
    .slice(0, 6)
    .map(({ lowPpm, highPpm }) => `${lowPpm.toFixed(3)} to ${highPpm.toFixed(3)} ppm`)
    .join(', ');
  const more = regions.length > 6 ? ` and ${regions.length - 6} more` : '';
  return [
    {
      holds: ALL_CLAIMS,
      reason: {
        code: 'unexplained-signal',
        detail: `There is signal that no compound of the method accounts for: ${places}${more}.`,
        regionsPpm: regions.map(({ lowPpm, highPpm }) => ({ lowPpm, highPpm })),
      },
    },
  ];
}

function searchDoubts({ search }: SpectrumAnswer): Holding[] {
  const holdings: Holding[] = [];
  if (!search.isAgreed) {
    holdings.push({
      holds: ALL_CLAIMS,
      reason: {
        code: 'search-did-not-agree',
        detail: `No two of ${search.populationCount} independent searches ended in the same best explanation, so a better one may exist.`,
      },
    });
  }
  if (!search.isConverged) {
    holdings.push({
      holds: ALL_CLAIMS,
      reason: { code: 'fit-did-not-converge', detail: 'The last climb to the best explanation had not come to rest.' },
    });
  }
  return holdings;
}

function percent(fraction: number): string {
  return `${(100 * fraction).toFixed(1)} %`;
}
