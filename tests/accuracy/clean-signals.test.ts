import type { CompoundBody, ResultBody } from '@spinassay/contract';
import { describe, expect, it } from 'vitest';
import { analyse } from './analyse-file.ts';
import { CLEAN_SIGNALS, type CleanSignal, cleanSignal } from './clean-signals.ts';

const SIGNAL_COUNT = 50;
/** Of 50: releasable, and inside the 95 % interval (issue 2). A coverage of 0.95 stays at 45 or above with chance 0.96. */
const RELEASABLE_MIN = 48;
const COVERED_MIN = 45;

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

describe(`${SIGNAL_COUNT} clean signals of 3 to 6 spins with a known standard`, () => {
  it('are releasable, right within 5 % and inside their intervals as often as promised', () => {
    let releasable = 0;
    let covered = 0;
    let withinFivePercent = 0;
    const relativeSds: number[] = [];
    for (let seed = 0; seed < SIGNAL_COUNT; seed += 1) {
      const signal = cleanSignal(seed);
      const result = analyseClean(signal);
      const truth = signal.amountMillimolesPerLitre;
      const posterior = result.compounds[0]?.amount?.posterior;
      if (posterior === undefined) throw new Error(`expected an amount for signal ${seed}`);
      const isReleasable = result.recommendation.overall === 'releasable';
      const isCovered = posterior.low95 <= truth && truth <= posterior.high95;
      releasable += isReleasable ? 1 : 0;
      covered += isCovered ? 1 : 0;
      withinFivePercent += Math.abs(posterior.value / truth - 1) < 0.05 ? 1 : 0;
      relativeSds.push(posterior.sd / truth);
      console.log(
        `signal ${seed}, ${signal.truth.shiftsPpm.length} spins: ${(100 * (posterior.value / truth - 1)).toFixed(2)} % off, sd ${((100 * posterior.sd) / truth).toFixed(2)} %, ${isCovered ? 'inside' : 'outside'}, ${result.recommendation.overall} ${result.recommendation.reasons.map(({ code }) => code).join(', ')}`,
      );
    }
    relativeSds.sort((a, b) => a - b);
    console.log(
      `of ${SIGNAL_COUNT}: ${releasable} releasable, ${withinFivePercent} within 5 %, ${covered} inside 95 %, median sd ${(100 * relativeSds[Math.floor(SIGNAL_COUNT / 2)]).toFixed(2)} %`,
    );
    expect(releasable).toBeGreaterThanOrEqual(RELEASABLE_MIN);
    expect(covered).toBeGreaterThanOrEqual(COVERED_MIN);
    expect(withinFivePercent).toBeGreaterThanOrEqual(RELEASABLE_MIN);
  }, 1_200_000);
});
