import {
  createSeededDraws,
  generateSignal,
  type RandomSpinSystem,
  randomComponent,
  randomSpinSystem,
} from '@spinassay/signal-generator';

/** Ranges of the clean signals, fixed before the first fit (2026-12-01). */
export const CLEAN_SIGNALS = {
  spinCounts: [3, 4, 5, 6],
  /** Largest line of the analyte in the tapered spectrum over the noise of one component, about. */
  signalToNoise: 300,
  sampleCount: 16384,
  dwellSeconds: 1 / 6000,
  hertzPerPpm: 500,
  carrierPpm: 4.7,
  amountMillimolesPerLitre: { low: 2, high: 40 },
  standardMillimolesPerLitre: 5,
  standardLinewidthHz: 1,
  phaseRadians: { low: -3, high: 3 },
  timeZeroSamples: { low: -0.05, high: 0.05 },
  /** The catalogue is the truth moved by the widths that a routine method gives. */
  catalogueShiftSdPpm: 0.03,
  catalogueCouplingSdHz: 0.5,
} as const;

/** One clean signal with its truth and what a catalogue would say of it. */
export interface CleanSignal {
  readonly seed: number;
  readonly samples: Float64Array;
  readonly truth: RandomSpinSystem;
  readonly amountMillimolesPerLitre: number;
  readonly catalogue: { readonly shiftsPpm: readonly number[]; readonly couplingsHz: readonly number[] };
}

/** Signal of one proton at 1 mmol/L: sets the scale, which nothing depends on. */
const SIGNAL_PER_MILLIMOLE = 1000;

/** Make clean signal number `seed`. */
export function cleanSignal(seed: number): CleanSignal {
  const settings = CLEAN_SIGNALS;
  const draws = createSeededDraws(seed + 7001);
  const spinCount = settings.spinCounts[draws.index(settings.spinCounts.length)];
  const truth = randomSpinSystem(seed + 9001, spinCount);
  const { low, high } = settings.amountMillimolesPerLitre;
  const amount = low * Math.exp(draws.uniform(0, 1) * Math.log(high / low));
  const analyte = randomComponent(truth, { ...settings, amount: amount * SIGNAL_PER_MILLIMOLE });
  const standard = {
    amount: 9 * settings.standardMillimolesPerLitre * SIGNAL_PER_MILLIMOLE,
    spins: [{ shiftHz: -settings.carrierPpm * settings.hertzPerPpm, group: 0 }],
    couplings: [],
    groups: [{ responseFactor: 1, decayPerSecond: Math.PI * settings.standardLinewidthHz }],
  };
  // A proton's multiplet of 8 lines, tapered: its largest line stands about 1/4 of amount * sqrt(effective samples) high.
  const decay = Math.PI * truth.linewidthHz;
  const effectiveSamples = 1 / (decay * settings.dwellSeconds);
  const linePeak = (0.25 * amount * SIGNAL_PER_MILLIMOLE * effectiveSamples) / Math.sqrt(settings.sampleCount);
  return {
    seed,
    samples: generateSignal({
      components: [analyte, standard],
      ...settings,
      phaseRadians: draws.uniform(settings.phaseRadians.low, settings.phaseRadians.high),
      timeZeroSamples: draws.uniform(settings.timeZeroSamples.low, settings.timeZeroSamples.high),
      noiseSdPerComponent: linePeak / settings.signalToNoise,
      seed: seed + 5001,
    }),
    truth,
    amountMillimolesPerLitre: amount,
    catalogue: {
      shiftsPpm: truth.shiftsPpm.map((shift) => shift + settings.catalogueShiftSdPpm * draws.normal()),
      couplingsHz: truth.couplings.map(
        ({ couplingHz }) => couplingHz + settings.catalogueCouplingSdHz * draws.normal(),
      ),
    },
  };
}
