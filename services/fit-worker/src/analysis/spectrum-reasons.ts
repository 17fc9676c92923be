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

function largeResiduals(answer: SpectrumAnswer, residualFractionMax: number): Holding[] {
  const poor = answer.windows.filter((w) => w.residualFraction > residualFractionMax && !isNoise(w.reducedChiSquare));
  const ofCompounds = poor.filter((window) => !holdsReferenceAlone(window, answer));
  const ofReference = poor.filter((window) => holdsReferenceAlone(window, answer));
  const holdings: Holding[] = [];
  if (ofCompounds.length > 0) {
    const worst = ofCompounds.reduce((a, b) => (b.residualFraction > a.residualFraction ? b : a));
    holdings.push({
      holds: ALL_CLAIMS,
      reason: {
        code: 'residual-too-large',
        detail: `The model leaves ${percent(worst.residualFraction)} of the signal unexplained between ${worst.lowPpm.toFixed(3)} and ${worst.highPpm.toFixed(3)} ppm; the method allows ${percent(residualFractionMax)}.`,
        regionsPpm: ofCompounds.map(({ lowPpm, highPpm }) => ({ lowPpm, highPpm })),
      },
    });
  }
  const [reference] = ofReference;
  if (reference !== undefined) {
    holdings.push({
      // Its place is good to a small share of its width all the same; an amount counted against it is not.
      holds: ['amounts'],
      reason: {
        code: 'reference-line-misshapen',
        detail: `The model leaves ${percent(reference.residualFraction)} of the reference line unexplained; the method allows ${percent(residualFractionMax)}. Amounts counted against it would carry that error.`,
        regionsPpm: [{ lowPpm: reference.lowPpm, highPpm: reference.highPpm }],
      },
    });
  }
  return holdings;
}

/** True for a window about 0 ppm in which no group of the compounds asked for stands. */
function holdsReferenceAlone(
  { lowPpm, highPpm }: { lowPpm: number; highPpm: number },
  answer: SpectrumAnswer,
): boolean {
  const isInside = (shift: number): boolean => shift >= lowPpm && shift <= highPpm;
  const shifts = answer.compounds.flatMap((compound) =>
    compound.spinSystems.flatMap((system) => system.groups.map((group) => group.shiftPpm.value)),
  );
  return answer.reference.isFound && isInside(0) && !shifts.some(isInside);
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
