import type { GeneratedComponent } from './isotopologues.ts';
import { createSeededDraws } from './seeded-draws.ts';

/**
 * Ranges of random truths, fixed before any of them was fitted (2026-12-01). Shifts as in small organic molecules; vicinal
 * couplings between neighbours, long-range ones between next neighbours, geminal ones where two shifts are drawn close.
 */
export const RANDOM_SYSTEM_RANGES = {
  shiftPpm: { low: 1.2, high: 4.4 },
  vicinalHz: { low: 2, high: 10 },
  longRangeHz: { low: -1.5, high: 1.5 },
  geminalHz: { low: -16, high: -11 },
  geminalShare: 0.3,
  geminalSeparationPpm: { low: 0.03, high: 0.35 },
  linewidthHz: { low: 0.6, high: 1.4 },
} as const;

/** A random chain of protons: what a catalogue of truths would hold. */
export interface RandomSpinSystem {
  readonly shiftsPpm: readonly number[];
  readonly couplings: readonly {
    readonly a: number;
    readonly b: number;
    readonly couplingHz: number;
    readonly kind: 'geminal' | 'vicinal' | 'long-range';
  }[];
  readonly linewidthHz: number;
}

/** Draw a chain of `spinCount` protons; neighbours are coupled, next neighbours weakly, some neighbours are a CH2. */
export function randomSpinSystem(seed: number, spinCount: number): RandomSpinSystem {
  const draws = createSeededDraws(seed);
  const ranges = RANDOM_SYSTEM_RANGES;
  const within = ({ low, high }: { low: number; high: number }): number => draws.uniform(low, high);
  const shiftsPpm: number[] = [];
  const isGeminal: boolean[] = [];
  for (let spin = 0; spin < spinCount; spin += 1) {
    const isPartner = spin > 0 && !isGeminal[spin - 1] && draws.uniform(0, 1) < ranges.geminalShare;
    isGeminal.push(isPartner);
    shiftsPpm.push(isPartner ? shiftsPpm[spin - 1] + within(ranges.geminalSeparationPpm) : within(ranges.shiftPpm));
  }
  const couplings: RandomSpinSystem['couplings'][number][] = [];
  for (let b = 1; b < spinCount; b += 1) {
    couplings.push(
      isGeminal[b]
        ? { a: b - 1, b, couplingHz: within(ranges.geminalHz), kind: 'geminal' }
        : { a: b - 1, b, couplingHz: within(ranges.vicinalHz), kind: 'vicinal' },
    );
    if (b < 2) continue;
    // Across a CH2 the coupling is vicinal to both of its protons.
    const isVicinal = isGeminal[b - 1] || isGeminal[b];
    couplings.push({
      a: b - 2,
      b,
      couplingHz: within(isVicinal ? ranges.vicinalHz : ranges.longRangeHz),
      kind: isVicinal ? 'vicinal' : 'long-range',
    });
  }
  return { shiftsPpm, couplings, linewidthHz: within(ranges.linewidthHz) };
}

/** The component that a random system makes at a field: every proton its own group, full response. */
export function randomComponent(
  system: RandomSpinSystem,
  at: { readonly amount: number; readonly hertzPerPpm: number; readonly carrierPpm: number },
): GeneratedComponent {
  const decayPerSecond = Math.PI * system.linewidthHz;
  return {
    amount: at.amount,
    spins: system.shiftsPpm.map((shift, group) => ({ shiftHz: (shift - at.carrierPpm) * at.hertzPerPpm, group })),
    couplings: system.couplings,
    groups: system.shiftsPpm.map(() => ({ responseFactor: 1, decayPerSecond })),
  };
}
