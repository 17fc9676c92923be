import type { Conditions, ResultBody } from '@spinassay/contract';
import { createSeededDraws } from '@spinassay/signal-generator';
import { convertShift, partsPerMillion } from '@spinassay/units';
import { beforeAll, expect, it } from 'vitest';
import { describeWithReferenceData } from '../reference-data.ts';
import { analyse, oneCompoundMethod, readFile, starterCompounds } from './analyse-file.ts';

const TSP = 'trimethylsilylpropanoate-d4';
const GABA = '4-aminobutyric-acid';

/** As the file's header says: 90 degree single pulse, 25 s delay, D2O, pH 6 (its title). */
const GABA_DECLARED: Conditions = { sequence: 'single-pulse', flipAngleDegrees: 90, pH: 6 };

/** The windows that the first issue names for the residual. */
const GABA_WINDOWS = [
  { lowPpm: 1.84, highPpm: 1.97 },
  { lowPpm: 2.24, highPpm: 2.37 },
  { lowPpm: 2.95, highPpm: 3.08 },
].map((window) => ({ ...window, baselineTermCount: 3 }));

function gabaFile(folder: string): {
  samples: Float64Array;
  dwellSeconds: number;
  observeFrequencyMHz: number;
  conditions: Conditions;
} {
  const { samples, dwellSeconds, observeFrequencyMHz, declared } = readFile(folder, 'GABA_500MHz_D2O_fid.jdx');
  return { samples, dwellSeconds, observeFrequencyMHz, conditions: { ...declared, ...GABA_DECLARED } };
}

describeWithReferenceData('4-aminobutyric acid, 20 mM in D2O, 500 MHz', (folder) => {
  let result: ResultBody;
  beforeAll(() => {
    const method = oneCompoundMethod(GABA, TSP, { windows: GABA_WINDOWS });
    result = analyse({ ...gabaFile(folder), method, compounds: starterCompounds(GABA, TSP) });
  });
  const system = (): ResultBody['compounds'][number]['spinSystems'][number] => result.compounds[0].spinSystems[0];

  it('is supported, explained and releasable for shifts and ratios', () => {
    expect(result.recommendation.reasons).toEqual([]);
    expect(result.compounds[0].presence.verdict).toBe('supported');
    expect(result.explainsSpectrum.verdict).toBe('supported');
    expect(result.recommendation.byClaim.map(({ claim, recommendation }) => [claim, recommendation])).toEqual([
      ['shifts', 'releasable'],
      ['ratios', 'releasable'],
    ]);
  });

  it('has the published shifts within 0.01 ppm on the DSS scale', () => {
    // Dashti et al. 2017/2018, BMRB bmse000871: 1.8933, 2.2861, 2.9974 ppm (DSS). The file is on the TSP scale at pH 6.
    const found = system()
      .groups.map(({ shift }) => convertShift(partsPerMillion(shift.value), { from: 'TSP', to: 'DSS' }, 6))
      .sort((a, b) => a - b);
    console.log(
      `GABA shifts, DSS scale: ${found.map((x) => x.toFixed(4)).join(' ')} ppm (published 1.8933 2.2861 2.9974)`,
    );
    [1.8933, 2.2861, 2.9974].forEach((published, i) => {
      expect(Math.abs(found[i] - published)).toBeLessThan(0.01);
    });
  });

  it("has J + J' and both couplings of the pair 1.91-3.02 ppm near the published ones", () => {
    // bmse000871: mean of 6.335 and 5.644, and of 8.905 and 9.543: 5.99 and 9.22, sum 15.21 Hz.
    const pairs = system().couplings.filter(({ kind }) => kind === 'vicinal');
    for (const { label, coupling } of pairs)
      console.log(`GABA ${label}: ${coupling.value.toFixed(3)} +- ${coupling.sd.toFixed(3)} Hz`);
    const ends = pairs.filter(
      ({ coupling }) => coupling.prior !== undefined && (coupling.prior.mean < 6.5 || coupling.prior.mean > 8.8),
    );
    const [low, high] = ends.map(({ coupling }) => coupling.value).sort((a, b) => a - b);
    expect(Math.abs(low + high - 15.21)).toBeLessThan(0.15);
    expect(Math.abs(low - 5.99)).toBeLessThan(0.35);
    expect(Math.abs(high - 9.22)).toBeLessThan(0.35);
  });

  it('has group ratios within 4 % of 1 and inside intervals of at most 5 % half-width', () => {
    for (const { label, ratio } of system().groups) {
      if (ratio === undefined) throw new Error('expected a ratio for every group');
      console.log(
        `GABA ratio ${label}: ${ratio.value.toFixed(4)} [${ratio.low95.toFixed(4)}, ${ratio.high95.toFixed(4)}]`,
      );
      expect(Math.abs(ratio.value - 1)).toBeLessThan(0.04);
      expect(ratio.low95).toBeLessThan(1);
      expect(ratio.high95).toBeGreaterThan(1);
      expect((ratio.high95 - ratio.low95) / 2).toBeLessThan(0.05);
    }
  });

  it('leaves at most 3 % of the signal in each window', () => {
    const windows = result.windows.filter(({ lowPpm }) => lowPpm > 1);
    for (const { lowPpm, residualFraction } of windows)
      console.log(`GABA window from ${lowPpm.toFixed(2)} ppm: residual ${(100 * residualFraction).toFixed(2)} %`);
    expect(windows.length).toBe(3);
    for (const { residualFraction } of windows) expect(residualFraction).toBeLessThanOrEqual(0.03);
  });

  it('names what leaving out the 29Si satellites does to the reference', () => {
    const { amplitude, amplitudeWithoutSatellites, facts } = result.reference;
    const withSatellites = Number(facts?.['amplitudeWithSatellites']);
    console.log(
      `TSP amplitude: ${withSatellites.toFixed(0)} with 29Si satellites, ${amplitudeWithoutSatellites?.toFixed(0)} without, ${amplitude?.toFixed(0)} in the joint fit`,
    );
    // Abundance 4.67 %: the unsplit model cannot hold all of it, nor more than it (29Si: REFERENCE section 10).
    const change = withSatellites / (amplitudeWithoutSatellites ?? Number.NaN) - 1;
    expect(Math.abs(change)).toBeLessThan(0.1);
    expect(change).not.toBe(0);
  });

  it('is releasable too when the windows are made from the panel, as in the README', () => {
    const made = analyse({
      ...gabaFile(folder),
      method: oneCompoundMethod(GABA, TSP),
      compounds: starterCompounds(GABA, TSP),
    });
    for (const { label, ratio } of made.compounds[0].spinSystems[0].groups) {
      console.log(
        `GABA ratio ${label}, own windows: ${ratio?.value.toFixed(4)} [${ratio?.low95.toFixed(4)}, ${ratio?.high95.toFixed(4)}]`,
      );
    }
    expect(made.recommendation.reasons).toEqual([]);
    expect(made.compounds[0].presence.verdict).toBe('supported');
  });

  it.each(['formic-acid', 'butyric-acid', 'l-glutamic-acid'])('never supports %s, and holds', (compoundId) => {
    const wrong = analyse({
      ...gabaFile(folder),
      method: oneCompoundMethod(compoundId, TSP),
      compounds: starterCompounds(compoundId, TSP),
    });
    const [found] = wrong.compounds;
    console.log(
      `only ${compoundId}: ${found.presence.verdict}, log Bayes factor ${found.presence.logBayesFactor.toFixed(1)}, ${wrong.recommendation.reasons.map(({ code }) => code).join(', ')}`,
    );
    expect(found.presence.verdict).not.toBe('supported');
    expect(wrong.recommendation.overall).toBe('held');
  });

  it('does not support the compound in noise of the same level, and gives an upper limit', () => {
    const file = gabaFile(folder);
    const draws = createSeededDraws(17);
    const samples = file.samples.map(() => result.signal.noiseSdPerComponent * draws.normal());
    const noise = analyse({
      ...file,
      samples,
      method: oneCompoundMethod(GABA, TSP),
      compounds: starterCompounds(GABA, TSP),
    });
    const { presence } = noise.compounds[0];
    console.log(
      `noise: ${presence.verdict}, log Bayes factor ${presence.logBayesFactor.toFixed(1)}, upper limit ${presence.upperLimit?.value}`,
    );
    expect(presence.verdict).toBe('not-supported');
    expect(presence.upperLimit?.value).toBeGreaterThan(0);
    expect(noise.recommendation.overall).toBe('held');
  });
});

describeWithReferenceData('ethyl crotonate in CDCl3, 500 MHz', (folder) => {
  it('is held because widths grow with intensity', () => {
    const { samples, dwellSeconds, observeFrequencyMHz, declared } = readFile(
      folder,
      'ethyl_crotonate_500MHz_CDCl3_fid.jdx',
    );
    const result = analyse({
      samples,
      dwellSeconds,
      observeFrequencyMHz,
      conditions: { ...declared, sequence: 'single-pulse', flipAngleDegrees: 30 },
      method: oneCompoundMethod('ethyl-crotonate', 'tetramethylsilane'),
      compounds: starterCompounds('ethyl-crotonate', 'tetramethylsilane'),
    });
    // REFERENCE section 10, from memory: 1.28, 4.18, 1.87, 6.97, 5.84 ppm; 7.1, 6.9, -1.7, 15.5 Hz.
    for (const { label, groups, couplings } of result.compounds[0].spinSystems) {
      for (const group of groups)
        console.log(
          `ethyl crotonate ${label} ${group.label}: ${group.shift.value.toFixed(4)} ppm (catalogue ${group.shift.prior?.mean})`,
        );
      for (const item of couplings)
        console.log(
          `ethyl crotonate ${item.label}: ${item.coupling.value.toFixed(3)} Hz (catalogue ${item.coupling.prior?.mean})`,
        );
    }
    console.log(`excess decay ${JSON.stringify(result.radiationDamping.facts)}`);
    expect(result.recommendation.overall).toBe('held');
    expect(result.recommendation.reasons[0].code).toBe('line-widths-grow-with-intensity');
    expect(result.radiationDamping.noticed).toBe(true);
  });
});
