import type { CompoundBody, ResultBody } from '@spinassay/contract';
import { analyse } from './analyse-file.ts';
import { CLEAN_SIGNALS, type CleanSignal, cleanSignal } from './clean-signals.ts';

const SOURCE = 'invented for this test';
const STANDARD: CompoundBody = {
  name: 'standard of nine protons',
  molarMassGramsPerMole: 170,
  scaleZero: 'DSS',
  spinSystems: [
    {
      label: 'singlet',
      count: 1,
      groups: [
        { label: 'CH3', shiftPpm: 0, shiftScale: 'DSS', spins: [{ label: 'CH3', protonCount: 9 }], source: SOURCE },
      ],
      couplings: [],
    },
  ],
  sources: [SOURCE],
};

function catalogueEntry({ catalogue, truth }: CleanSignal): CompoundBody {
  return {
    name: 'random chain of protons',
    molarMassGramsPerMole: 100,
    spinSystems: [
      {
        label: 'chain',
        count: 1,
        groups: catalogue.shiftsPpm.map((shiftPpm, i) => ({
          label: `H${i + 1}`,
          shiftPpm,
          shiftScale: 'DSS',
          spins: [{ label: `H${i + 1}`, protonCount: 1 }],
          source: SOURCE,
        })),
        couplings: truth.couplings.map(({ a, b, kind }, i) => ({
          label: `J(${a + 1},${b + 1})`,
          pairs: [[`H${a + 1}`, `H${b + 1}`]],
          couplingHz: catalogue.couplingsHz[i],
          kind,
          source: SOURCE,
        })),
      },
    ],
    sources: [SOURCE],
  };
}

function analyseClean(signal: CleanSignal): ResultBody {
  return analyse({
    samples: signal.samples,
    dwellSeconds: CLEAN_SIGNALS.dwellSeconds,
    observeFrequencyMHz: CLEAN_SIGNALS.hertzPerPpm * (1 + CLEAN_SIGNALS.carrierPpm * 1e-6),
    conditions: {
      sequence: 'single-pulse',
      flipAngleDegrees: 90,
      recycleDelaySeconds: 60,
      carrierPpm: CLEAN_SIGNALS.carrierPpm,
      referenceFrequencyMHz: CLEAN_SIGNALS.hertzPerPpm,
    },
    method: {
      name: 'clean signals',
      panel: [{ compoundId: 'chain', compoundVersion: 1 }],
      reference: { compoundId: 'standard', compoundVersion: 1 },
      standard: { compoundId: 'standard' },
      claims: ['shifts', 'ratios', 'amounts'],
    },
    compounds: { chain: { version: 1, body: catalogueEntry(signal) }, standard: { version: 1, body: STANDARD } },
    preparation: {
      standard: {
        compoundId: 'standard',
        amountConcentration: {
          value: CLEAN_SIGNALS.standardMillimolesPerLitre,
          standardUncertainty: 1e-6,
          unit: 'mmol/L',
        },
      },
    },
    seed: BigInt(signal.seed),
  });
}

/** Clean signals in all; two tests take half of them each, to run side by side. */
const SIGNAL_COUNT = 50;

/** What came of a run of clean signals. */
export interface CleanCount {
  readonly signals: number;
  readonly releasable: number;
  readonly covered: number;
  readonly withinFivePercent: number;
}

/** Analyse every second clean signal from `first` to 49, print each, and count. */
export function countCleanSignals(first: 0 | 1): CleanCount {
  let signals = 0;
  let releasable = 0;
  let covered = 0;
  let withinFivePercent = 0;
  const relativeSds: number[] = [];
  for (let seed = first; seed < SIGNAL_COUNT; seed += 2) {
    const signal = cleanSignal(seed);
    const result = analyseClean(signal);
    const truth = signal.amountMillimolesPerLitre;
    const posterior = result.compounds[0]?.amount?.posterior;
    if (posterior === undefined) throw new Error(`expected an amount for signal ${seed}`);
    const isCovered = posterior.low95 <= truth && truth <= posterior.high95;
    signals += 1;
    releasable += result.recommendation.overall === 'releasable' ? 1 : 0;
    covered += isCovered ? 1 : 0;
    withinFivePercent += Math.abs(posterior.value / truth - 1) < 0.05 ? 1 : 0;
    relativeSds.push(posterior.sd / truth);
    console.log(
      `signal ${seed}, ${signal.truth.shiftsPpm.length} spins: ${(100 * (posterior.value / truth - 1)).toFixed(2)} % off, sd ${((100 * posterior.sd) / truth).toFixed(2)} %, ${isCovered ? 'inside' : 'outside'}, ${result.recommendation.overall} ${result.recommendation.reasons.map(({ code }) => code).join(', ')}`,
    );
  }
  relativeSds.sort((a, b) => a - b);
  const median = relativeSds[Math.floor(signals / 2)];
  console.log(
    `of ${signals}: ${releasable} releasable, ${withinFivePercent} within 5 %, ${covered} inside 95 %, median sd ${(100 * median).toFixed(2)} %`,
  );
  return { signals, releasable, covered, withinFivePercent };
}
