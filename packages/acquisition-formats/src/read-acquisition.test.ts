import { sampleCountLimits } from '@spinassay/contract';
import { describe, expect, test } from 'vitest';
import { fidFile, type Replacement, smallFid } from '../test-support/fid-file.ts';
import type { Fault } from './fault-list.ts';
import { type ReadAcquisition, readAcquisition } from './read-acquisition.ts';
import { readingLimits } from './reading-limits.ts';

function read(...replacements: Replacement[]): ReadAcquisition {
  const reading = readAcquisition(fidFile(...replacements));
  if (!reading.ok) throw new Error(JSON.stringify(reading.faults));
  return reading.acquisition;
}

function faultsOf(file: string | Uint8Array, limits = readingLimits): readonly Fault[] {
  const reading = readAcquisition(file, limits);
  return reading.ok ? [] : reading.faults;
}

const codesOf = (...replacements: Replacement[]): string[] =>
  faultsOf(fidFile(...replacements)).map((fault) => fault.code);

/** The small file begun two dwell times late: time zero is at sample -2. */
const lateAxis: readonly Replacement[] = [
  ['##FIRST= 0, 1', '##FIRST= 0.001, 1'],
  ['##LAST= 0.0075', '##LAST= 0.0085'],
  ['0 1 2 3', '2 1 2 3'],
  ['8 -2', '10 -2'],
  ['0 9 8', '2 9 8'],
  ['8 1 0', '10 1 0'],
];

test('reads samples, scales and title of a file in plain numbers', () => {
  const { real, imaginary } = smallFid;
  expect(read()).toEqual({
    kind: 'fid',
    nucleus: '1H',
    title: 'small file',
    samples: Float64Array.from(real.flatMap((value, index) => [value, imaginary[index] ?? Number.NaN])),
    sampleCount: 16,
    dwellSeconds: 0.0005,
    observeFrequencyMHz: 500.13,
    declared: {},
  });
});

test('applies the FACTOR of each component', () => {
  const { samples } = read(
    ['##FACTOR= 0.0005, 1, 1, 1', '##FACTOR= 0.0005, 0.5, 2, 1'],
    ['##FIRST= 0, 1, 9, 1', '##FIRST= 0, 0.5, 18, 1'],
    ['##LAST= 0.0075, 7, -6, 2', '##LAST= 0.0075, 3.5, -12, 2'],
    ['##MIN= 0, -500, -6, 1', '##MIN= 0, -250, -12, 1'],
    ['##MAX= 0.0075, 40, 9, 2', '##MAX= 0.0075, 20, 18, 2'],
  );
  expect([...samples.subarray(0, 4)]).toEqual([0.5, 18, 1, 16]);
});

describe('labels', () => {
  // McDonald & Wilks 1988: labels are compared without regard to case, blanks, hyphens, slashes and underscores.
  test('are compared without case, blanks, hyphens, slashes and underscores', () => {
    expect(
      read(
        ['##DATA TYPE=', '##data_type='],
        ['##.OBSERVE FREQUENCY=', '  ##.observe-frequency='],
        ['##VAR_DIM=', '##Var/Dim='],
        ['##DATA TABLE= (X++(R..R)), XYDATA', '##DATATABLE=(x++(r..r)),xydata $$ real part'],
      ).sampleCount,
    ).toBe(16);
  });
  test('may hold comments, several lines and other line breaks', () => {
    const file = fidFile(
      ['##TITLE= small file', '$$ made by hand\n##TITLE= small $$ remark\n  file\n##= a comment record'],
      ['##FACTOR= 0.0005, 1, 1, 1', '##FACTOR= 0.0005,\n1, 1,\n1 $$ last'],
    );
    for (const lineBreak of ['\n', '\r\n', '\r']) {
      expect(readAcquisition(file.replaceAll('\n', lineBreak))).toMatchObject({
        ok: true,
        acquisition: { title: 'small\nfile', sampleCount: 16 },
      });
    }
  });
  test('of free text may hold letters beyond ASCII, in UTF-8 or Windows-1252', () => {
    const file = fidFile(['small file', 'Sauerl\u00e4nder']);
    for (const bytes of [Buffer.from(file, 'utf8'), Buffer.from(file, 'latin1')]) {
      expect(readAcquisition(bytes)).toMatchObject({ ok: true, acquisition: { title: 'Sauerl\u00e4nder' } });
    }
  });
});

describe('the time axis', () => {
  test('is taken from FIRST and LAST where X has no FACTOR', () => {
    expect(
      read(['##FACTOR= 0.0005, 1, 1, 1', '##FACTOR= 1, 1, 1, 1'], ['8 -2 -3', '0.004 -2 -3'], ['8 1 0', '4.0E-3 1 0'])
        .dwellSeconds,
    ).toBeCloseTo(0.0005, 15);
  });
  test('places time zero where it does not begin at zero', () => {
    expect(read(...lateAxis).declared).toEqual({ timeZeroSampleIndex: -2 });
  });
  test('may begin late and say so in the label too', () => {
    const label: Replacement = ['##NTUPLES= NMR FID\n', '##$TIME ZERO POINT= -2.005\n##NTUPLES= NMR FID\n'];
    expect(read(...lateAxis, label).declared).toEqual({ timeZeroSampleIndex: -2.005 });
  });
});

test('takes the declared conditions and leaves the sequence undeclared whatever the free text says', () => {
  const { declared, pulseSequenceText } = read([
    '##NTUPLES= NMR FID\n',
    [
      '##.PULSE SEQUENCE= single-pulse',
      '##.AVERAGES= 64',
      '##.SOLVENT NAME= D2O',
      '##TEMPERATURE= 298.15 K',
      '##.ACQUISITION TIME= 0.008',
      '##$REFERENCE FREQUENCY MHZ= 500.1275',
      '##$CARRIER PPM= 4.9987 $$ rounded',
      '##$RECYCLE DELAY SECONDS= 0',
      '##$SPECTRAL WIDTH HZ= 2000',
      '##$TIME ZERO POINT= -0.4',
      '##NTUPLES= NMR FID\n',
    ].join('\n'),
  ]);
  expect(pulseSequenceText).toBe('single-pulse');
  expect(declared).toEqual({
    scanCount: 64,
    solvent: 'D2O',
    temperatureCelsius: 25,
    acquisitionTimeSeconds: 0.008,
    referenceFrequencyMHz: 500.1275,
    carrierPpm: 4.9987,
    recycleDelaySeconds: 0,
    spectralWidthHz: 2000,
    timeZeroSampleIndex: -0.4,
  });
});

describe('refuses', () => {
  const withLabel = (label: string): readonly [string, string] => [
    '##NTUPLES= NMR FID\n',
    `${label}\n##NTUPLES= NMR FID\n`,
  ];
  const mode = '##.ACQUISITION MODE= SIMULTANEOUS\n';
  const imaginaryTable = '##DATA TABLE= (X++(I..I)), XYDATA';
  test.each<[string, string[], Replacement[]]>([
    ['a processed spectrum', ['processed-spectrum'], [['##DATA TYPE= NMR FID', '##DATA TYPE= NMR SPECTRUM']]],
    ['other spectroscopy', ['not-an-nmr-fid'], [['##DATA TYPE= NMR FID', '##DATA TYPE= INFRARED SPECTRUM']]],
    ['a FID in two dimensions', ['not-one-dimensional'], [['##DATA TYPE= NMR FID', '##DATA TYPE= nD NMR FID']]],
    ['two time variables', ['not-one-dimensional'], [['##SYMBOL= X, R, I, N', '##SYMBOL= T1, T2, R, I']]],
    ['a stated second dimension', ['not-one-dimensional'], [withLabel('##NUM DIM= 2')]],
    ['a single component', ['real-only'], [['##DATA CLASS= NTUPLES', '##DATA CLASS= XYDATA']]],
    ['an absent data type', ['missing-label'], [['##DATA TYPE= NMR FID\n', '']]],
    ['another version', ['unsupported-version'], [['##JCAMP-DX= 6.0', '##JCAMP-DX= 4.24']]],
    ['an absent version', ['missing-label'], [['##JCAMP-DX= 6.0\n', '']]],
    ['another nucleus', ['wrong-nucleus'], [['^1H', '^13C']]],
    ['an absent nucleus', ['missing-label'], [['##.OBSERVE NUCLEUS= ^1H\n', '']]],
    ['sequential sampling', ['unsupported-acquisition-mode'], [[mode, '##.ACQUISITION MODE= SEQUENTIAL\n']]],
    ['an unknown acquisition mode', ['missing-label'], [[mode, '']]],
    ['an absent observe frequency', ['missing-label'], [['##.OBSERVE FREQUENCY= 500.13\n', '']]],
    ['a negative observe frequency', ['number-out-of-range'], [['500.13', '-500.13']]],
    ['an observe frequency in words', ['unreadable-number'], [['500.13', '500.13 MHz']]],
    ['time in other units', ['unsupported-time-unit'], [['UNITS= SECONDS', 'UNITS= MICROSECONDS']]],
    ['hidden limits of time', ['missing-label'], [['##LAST= 0.0075, 7, -6, 2\n', '']]],
    ['a dwell time of zero', ['dwell-not-positive'], [['##LAST= 0.0075', '##LAST= 0']]],
    ['a FACTOR of zero', ['number-out-of-range'], [['##FACTOR= 0.0005', '##FACTOR= 0']]],
    ['an absent length', ['missing-label'], [['##VAR_DIM= 16, 16, 16, 2\n', '']]],
    ['components of two lengths', ['dimension-differs'], [['16, 16, 16, 2', '16, 16, 15, 2']]],
    ['a page of another length', ['dimension-differs'], [['##PAGE= N=2', '##PAGE= N=2\n##NPOINTS= 15']]],
    ['too few points', ['sample-count-out-of-range'], [['16, 16, 16, 2', '15, 15, 15, 2']]],
    ['too many points', ['sample-count-out-of-range'], [['16, 16, 16, 2', '4194305, 4194305, 4194305, 2']]],
    ['half a point', ['sample-count-out-of-range'], [['16, 16, 16, 2', '16.5, 16.5, 16.5, 2']]],
    ['more entries than symbols', ['too-many-entries'], [['16, 16, 16, 2', '16, 16, 16, 2, 5']]],
    ['words for numbers', ['unreadable-number'], [['##MIN= 0, -500', '##MIN= 0, low']]],
    ['no symbols', ['missing-label'], [['##SYMBOL= X, R, I, N\n', '']]],
    ['a missing variable', ['missing-variable'], [['##SYMBOL= X, R, I, N', '##SYMBOL= X, R, N, N']]],
    ['another table form', ['unsupported-table-form', 'missing-page'], [[imaginaryTable, '##DATA TABLE= (XY..XY)']]],
    ['a third page', ['repeated-page'], [['##END NTUPLES', `##PAGE= N=3\n${imaginaryTable}\n0 1\n##END NTUPLES`]]],
    ['a label given twice', ['repeated-label'], [withLabel('##.OBSERVE FREQUENCY= 600.1')]],
    ['a label without equals sign', ['label-without-equals-sign'], [withLabel('##OWNER nobody')]],
    ['a block in a block', ['compound-file'], [withLabel('##TITLE= another')]],
    ['a link file', ['compound-file'], [['##DATA TYPE= NMR FID', '##DATA TYPE= LINK']]],
    ['an open block', ['missing-end'], [['##END=\n', '']]],
    ['open pages', ['missing-end'], [['##END NTUPLES= NMR FID\n', '']]],
    ['text behind the end', ['content-after-end'], [['##END=\n', '##END=\nmore\n']]],
    ['text before the beginning', ['not-jcamp-dx'], [['##TITLE', 'hello\n##TITLE']]],
    ['another first label', ['not-jcamp-dx'], [['##TITLE=', '##OWNER=']]],
    ['an axis against the spectral width', ['dwell-disagrees'], [withLabel('##$SPECTRAL WIDTH HZ= 4000')]],
    [
      'a carrier against the frequencies',
      ['carrier-disagrees'],
      [withLabel('##$CARRIER PPM= 4.7\n##$REFERENCE FREQUENCY MHZ= 500.1275')],
    ],
    ['time zero in two places', ['time-zero-disagrees'], [...lateAxis, withLabel('##$TIME ZERO POINT= 0')]],
    ['a lost line', ['ordinate-count-differs'], [['8 -2 -3 40 -500 0 0 7 7\n', '']]],
    ['a shifted line', ['x-check-failed'], [['8 -2 -3', '9 -2 -3']]],
    ['an ordinate too many', ['too-many-ordinates'], [['0 0 7 7', '0 0 7 7 7']]],
    ['a damaged first ordinate', ['ordinate-check-failed'], [['0 1 2 3', '0 2 2 3']]],
    ['a damaged last ordinate', ['ordinate-check-failed'], [['0 0 7 7', '0 0 7 8']]],
    ['a damaged smallest ordinate', ['ordinate-check-failed'], [['-500 0 0', '-501 0 0']]],
    ['a damaged largest ordinate', ['ordinate-check-failed'], [['-3 40', '-3 4']]],
    ['an unknown ordinate', ['missing-ordinate', 'ordinate-count-differs'], [['0 0 7 7', '0 0 7 ?']]],
  ])('%s', (_name, codes, replacements) => {
    expect(codesOf(...replacements)).toEqual(codes);
  });
});

test('names every fault at once, each with its line', () => {
  const faults = faultsOf(fidFile(['^1H', '^13C'], ['500.13', '0'], ['SIMULTANEOUS', 'SINGLE'], ['8 1 0', '9 1 0']));
  expect(faults.map(({ code, line }) => [code, line])).toEqual([
    ['wrong-nucleus', 6],
    ['unsupported-acquisition-mode', 7],
    ['number-out-of-range', 5],
    ['x-check-failed', 27],
  ]);
});

describe('limits', () => {
  test('of the number of samples are those of the contract', () => {
    const { sampleCountMin, sampleCountMax } = readingLimits;
    expect({ min: sampleCountMin, max: sampleCountMax }).toEqual(sampleCountLimits);
  });
  test.each([
    ['file-too-large', { byteCountMax: 100 }],
    ['line-too-long', { lineLengthMax: 40 }],
    ['too-many-labels', { labelCountMax: 10 }],
  ])('report %s', (code, limits) => {
    expect(faultsOf(fidFile(), { ...readingLimits, ...limits })[0]).toMatchObject({ code });
  });
  test('keep the list of faults short and say how many are left out', () => {
    const file = fidFile(['0 1 2 3', `${'0 !\n'.repeat(1_000)}0 1 2 3`]);
    const faults = faultsOf(file);
    expect(faults).toHaveLength(readingLimits.faultCountMax + 1);
    expect(faults[readingLimits.faultCountMax]).toMatchObject({ code: 'more-faults' });
  });
});

test.each([
  ['nothing', ''],
  ['blanks', ' \n\n'],
  ['a comment', '$$ nothing else'],
  ['JSON', '{"a": 1}'],
])('calls %s not JCAMP-DX', (_name, text) => {
  expect(faultsOf(text).map((fault) => fault.code)).toEqual(['not-jcamp-dx']);
});

test('calls bytes with zeros not text', () => {
  expect(faultsOf(new Uint8Array([35, 35, 0, 1])).map((fault) => fault.code)).toEqual(['not-text']);
});
