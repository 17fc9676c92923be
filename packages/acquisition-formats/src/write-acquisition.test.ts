import { describe, expect, test } from 'vitest';
import { type ReadAcquisition, readAcquisition } from './read-acquisition.ts';
import { UnwritableAcquisitionError, writeAcquisition } from './write-acquisition.ts';

const whole: ReadAcquisition = {
  kind: 'fid',
  nucleus: '1H',
  title: 'round trip',
  pulseSequenceText: 'one pulse',
  samples: Float64Array.from({ length: 400 }, (_, index) =>
    index < 300 ? Math.round(2e9 * Math.cos(index) * Math.exp(-index / 40)) : 0,
  ),
  sampleCount: 200,
  dwellSeconds: 1 / 6002.40096038,
  observeFrequencyMHz: 500.1625008,
  declared: {
    referenceFrequencyMHz: 500.159961494,
    carrierPpm: 5.076989,
    spectralWidthHz: 6002.40096038,
    timeZeroSampleIndex: -0.4,
    temperatureCelsius: 29.55,
    solvent: 'D2O',
    recycleDelaySeconds: 25,
    acquisitionTimeSeconds: 200 / 6002.40096038,
    scanCount: 64,
  },
};
const scaled = { ...whole, samples: whole.samples.map((value) => value * 1.234e-9) };

test('whole numbers come back bit for bit from differences', () => {
  expect(readAcquisition(writeAcquisition(whole, 'difdup'))).toEqual({ ok: true, acquisition: whole });
});

test('any numbers come back bit for bit from plain text', () => {
  expect(readAcquisition(writeAcquisition(scaled, 'affn'))).toEqual({ ok: true, acquisition: scaled });
});

// McDonald & Wilks 1988: at most 80 characters a line.
test.each(['affn', 'difdup'] as const)('keeps lines of %s within 80 characters', (form) => {
  const longest = Math.max(
    ...writeAcquisition(whole, form)
      .split('\n')
      .map((line) => line.length),
  );
  expect(longest).toBeLessThanOrEqual(80);
});

test('writes the published example of differences with a repeat', () => {
  // The ASDF row of McDonald & Wilks 1988 (from memory): 1JJ%jX is 1, 2, 3, 3, 2, 1, 0, -1, -2, -3.
  const samples = new Float64Array(32);
  [1, 2, 3, 3, 2, 1, 0, -1, -2, -3].forEach((value, index) => {
    samples[2 * index] = value;
  });
  const lines = writeAcquisition({ ...whole, samples, sampleCount: 16 }, 'difdup').split('\n');
  expect(lines.find((line) => line.startsWith('0A'))).toMatch(/^0AJJ%jX/);
});

describe('free text', () => {
  test('cannot begin a label or a comment', () => {
    const hostile = { ...whole, title: 'a\n##END=\n$$ b', declared: { ...whole.declared, solvent: 'D2O $$$ x' } };
    expect(readAcquisition(writeAcquisition(hostile, 'difdup'))).toMatchObject({
      ok: true,
      acquisition: { title: 'a ##END= $ $ b', declared: { solvent: 'D2O $ $ $ x' } },
    });
  });
});

describe('refuses', () => {
  test('fractions as differences', () => {
    expect(() => writeAcquisition(scaled, 'difdup')).toThrow(UnwritableAcquisitionError);
  });
  test.each([Number.NaN, Infinity])('a sample of %d', (value) => {
    const samples = whole.samples.slice().fill(value, 7, 8);
    expect(() => writeAcquisition({ ...whole, samples }, 'affn')).toThrow('sample 3 is');
  });
  test('fewer samples than stated', () => {
    expect(() => writeAcquisition({ ...whole, samples: new Float64Array(4) }, 'affn')).toThrow('sample 2 is');
  });
});
