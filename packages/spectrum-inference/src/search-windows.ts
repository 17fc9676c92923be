import type { WindowRange } from './bin-windows.ts';
import type { ParameterLayout } from './parameter-layout.ts';
import type { SpinSystemQuestion, WindowQuestion } from './spectrum-question.ts';

/** Half-width, in prior sd of a shift, of the range in which a group is looked for. */
const SEARCH_REACH_SD = 3;
/** Room for the wings of the outer lines, Hz. */
const WING_HZ = 8;
/** Baseline terms of a window, and one more for each of these widths beyond the first two (REAL-DATA section 5). */
const BASELINE_TERMS = 3;
const BASELINE_TERM_PPM = 0.1;

/**
 * The windows of one rung: those of the method if it names any, else the prior range of every group.
 *
 * @param softWindowPerSecond widens both by the breadth it gives to lines
 */
export function searchWindows(
  layout: ParameterLayout,
  asked: readonly WindowQuestion[],
  zeroHz: number,
  softWindowPerSecond: number,
): WindowRange[] {
  const broadening = (0.75 * softWindowPerSecond) / Math.PI;
  const ranges =
    asked.length > 0
      ? asked.map((window) => ({
          lowHz: zeroHz + window.lowPpm * layout.hertzPerPpm - broadening,
          highHz: zeroHz + window.highPpm * layout.hertzPerPpm + broadening,
          terms: window.baselineTermCount,
        }))
      : priorRanges(layout, zeroHz, broadening);
  return mergeRanges(ranges, layout.hertzPerPpm, softWindowPerSecond);
}

interface RawRange {
  lowHz: number;
  highHz: number;
  terms?: number | undefined;
}

/** The windows of the statistics round a mode: every line of it with room for its wings. */
export function windowsRoundLines(
  frequenciesHz: readonly number[],
  marginHz: number,
  hertzPerPpm: number,
): WindowRange[] {
  return mergeRanges(
    frequenciesHz.map((frequency) => ({ lowHz: frequency - marginHz, highHz: frequency + marginHz })),
    hertzPerPpm,
    0,
  );
}

function priorRanges(layout: ParameterLayout, zeroHz: number, broadening: number): RawRange[] {
  const offsetSd = layout.parameters[layout.commonOffset].unit;
  return layout.compounds.flatMap((compound, c) =>
    compound.spinSystems.flatMap((system) =>
      system.groups.map((group, g) => {
        const isReference = c === layout.referenceIndex;
        const shiftHz = isReference ? 0 : group.shiftPpm.mean * layout.hertzPerPpm;
        const sdHz = isReference ? 0 : Math.hypot(group.shiftPpm.sd, offsetSd) * layout.hertzPerPpm;
        const half = multipletHalfWidthHz(system, g) + SEARCH_REACH_SD * sdHz + WING_HZ + broadening;
        return { lowHz: zeroHz + shiftHz - half, highHz: zeroHz + shiftHz + half };
      }),
    ),
  );
}

/** Half of the first-order extent of a group's multiplet: half the sum of its couplings to other groups. */
export function multipletHalfWidthHz(system: SpinSystemQuestion, groupIndex: number): number {
  const spins = system.groups.flatMap((group, g) => group.spins.map((spin) => ({ g, protonCount: spin.protonCount })));
  const extents = spins.map((spin, index) => {
    if (spin.g !== groupIndex) return 0;
    let sum = 0;
    for (const { couplingHz, pairs } of system.couplings) {
      for (const [a, b] of pairs) {
        const partner = a === index ? b : b === index ? a : -1;
        if (partner >= 0 && spins[partner].g !== groupIndex) {
          sum += (Math.abs(couplingHz.mean) + couplingHz.sd) * spins[partner].protonCount;
        }
      }
    }
    return sum / 2;
  });
  return Math.max(0, ...extents);
}

function mergeRanges(ranges: readonly RawRange[], hertzPerPpm: number, softWindowPerSecond: number): WindowRange[] {
  const sorted = [...ranges].sort((a, b) => a.lowHz - b.lowHz);
  const merged: RawRange[] = [];
  for (const range of sorted) {
    const last = merged.at(-1);
    if (last !== undefined && range.lowHz <= last.highHz) {
      last.highHz = Math.max(last.highHz, range.highHz);
      if (last.terms !== undefined || range.terms !== undefined)
        last.terms = Math.max(last.terms ?? 0, range.terms ?? 0);
    } else merged.push({ ...range });
  }
  return merged.map(({ lowHz, highHz, terms }) => {
    const wide = Math.max(0, Math.floor((highHz - lowHz) / hertzPerPpm / BASELINE_TERM_PPM) - 2);
    // Soft lines are as broad as the baseline's shapes: two terms leave them something to be seen by.
    const baselineTermCount = softWindowPerSecond >= 30 ? 2 : (terms ?? BASELINE_TERMS + wide);
    return { lowHz, highHz, baselineTermCount };
  });
}

/** The parts of some windows that lie inside others; baseline terms as in the narrower ones. */
export function intersectRanges(narrow: readonly WindowRange[], wide: readonly WindowRange[]): WindowRange[] {
  return narrow.flatMap((range) =>
    wide.flatMap((limit) => {
      const lowHz = Math.max(range.lowHz, limit.lowHz);
      const highHz = Math.min(range.highHz, limit.highHz);
      return highHz > lowHz ? [{ ...range, lowHz, highHz }] : [];
    }),
  );
}
