import { FAULT_RANGES } from './fault-ranges.ts';
import type { UnknownLine } from './faults/unknown-line.ts';
import { createSeededDraws, type SeededDraws } from './seeded-draws.ts';
import type { SignalFaults } from './signal-faults.ts';

/** What random faults have to know of the measurement that they will spoil. */
export interface FaultSetting {
  readonly seed: number;
  /** Signal of one proton of the main compound at time zero: amounts of faults are in its units. */
  readonly protonSignal: number;
  /** Where unknown lines may lie, Hz from the carrier. */
  readonly lowHz: number;
  readonly highHz: number;
  /** Steps of the feedback of radiation damping within one dwell. */
  readonly stepsPerSample: number;
}

/**
 * Every fault at once, each drawn from FAULT_RANGES. Leave out what is not wanted. The converter is not among them: its full scale
 * follows the receiver's gain, which the caller sets.
 */
export function randomFaults({ seed, protonSignal, lowHz, highHz, stepsPerSample }: FaultSetting): SignalFaults {
  const draws = createSeededDraws(seed);
  const ranges = FAULT_RANGES;
  const within = ({ low, high }: Range): number => draws.uniform(low, high);
  const decayPerSecond = within(ranges.radiationDecayPerSecond);
  return {
    unknownLines: Array.from({ length: 1 + draws.index(ranges.unknownLineCountMax) }, () =>
      unknownLine(draws, { protonSignal, lowHz, highHz }),
    ),
    radiationDamping: {
      decayPerSecond,
      pullRadPerSecond: decayPerSecond * within(ranges.radiationPullPerDecay),
      ofSignal: protonSignal,
      stepsPerSample,
    },
    shim: Array.from({ length: ranges.shimCopyCount }, () => ({
      share: within(ranges.shimShare),
      offsetHz: within(ranges.shimOffsetHz),
      extraDecayPerSecond: within(ranges.shimExtraDecayPerSecond),
    })),
    fieldDrift: { hertzPerSecond: within(ranges.driftHertzPerSecond), scanRangeHz: within(ranges.driftScanRangeHz) },
    firstSampleErrors: ranges.firstSampleErrors.flatMap((range) =>
      Array.from({ length: range.count }, () => within(range)),
    ),
    receiverOffset: {
      re: protonSignal * within(ranges.receiverOffset),
      im: protonSignal * within(ranges.receiverOffset),
      driftRePerSecond: protonSignal * within(ranges.receiverDriftPerSecond),
      driftImPerSecond: protonSignal * within(ranges.receiverDriftPerSecond),
    },
  };
}

type Range = { readonly low: number; readonly high: number };

function unknownLine(
  draws: SeededDraws,
  { protonSignal, lowHz, highHz }: Pick<FaultSetting, 'protonSignal' | 'lowHz' | 'highHz'>,
): UnknownLine {
  const within = ({ low, high }: Range): number => draws.uniform(low, high);
  const line = {
    amount: protonSignal * within(FAULT_RANGES.unknownLineAmount),
    shiftHz: draws.uniform(lowHz, highHz),
    decayPerSecond: within(FAULT_RANGES.unknownDecayPerSecond),
  };
  const isDoublet = draws.index(2) === 1;
  return isDoublet ? { ...line, splittingHz: within(FAULT_RANGES.unknownSplittingHz) } : line;
}
