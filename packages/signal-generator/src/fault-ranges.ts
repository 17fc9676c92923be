/**
 * Ranges that random faults are drawn from, fixed on 2026-12-01, before any signal with these faults was fitted.
 *
 * First samples and radiation damping: as measured on seven samples at 300 to 600 MHz (REAL-DATA sections 2 and 3). All others: common
 * practice, no source. Amounts are in signals of one proton.
 */
export const FAULT_RANGES = {
  unknownLineCountMax: 3,
  unknownLineAmount: { low: 0.01, high: 0.3 },
  /** Half of the unknown lines are doublets. */
  unknownSplittingHz: { low: 3, high: 9 },
  unknownDecayPerSecond: { low: 2, high: 6 },
  /** What a line of one proton gains: nothing in a dilute sample, 1.0 and 1.9 in two concentrated ones. */
  radiationDecayPerSecond: { low: 0, high: 1.9 },
  /** 0.25, 0.27 and 0.33 were measured. */
  radiationPullPerDecay: { low: 0.25, high: 0.35 },
  shimCopyCount: 3,
  shimShare: { low: 0.02, high: 0.12 },
  shimOffsetHz: { low: -1, high: 1 },
  shimExtraDecayPerSecond: { low: 0, high: 4 },
  driftHertzPerSecond: { low: -0.02, high: 0.02 },
  driftScanRangeHz: { low: 0, high: 0.15 },
  /** Shares of the rms signal: sample 0, 1, 2, then 3 to 5, 6 to 11, 12 to 15. */
  firstSampleErrors: [
    { count: 1, low: 0.84, high: 1.55 },
    { count: 1, low: 0.19, high: 0.23 },
    { count: 1, low: 0.12, high: 0.16 },
    { count: 3, low: 0.05, high: 0.22 },
    { count: 6, low: 0.01, high: 0.12 },
    { count: 4, low: 0.005, high: 0.09 },
  ],
  receiverOffset: { low: -0.002, high: 0.002 },
  receiverDriftPerSecond: { low: -0.0005, high: 0.0005 },
} as const;
