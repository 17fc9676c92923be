import type { SignalBody } from '@spinassay/contract';
import { describe, expect, test } from 'vitest';
import { readJsonSignal } from './read-json-signal.ts';

// Components 0, 1, -2, 3, ... of 16 samples. The bytes are laid out by Node's Buffer, a writer that is not ours.
const components = Array.from({ length: 32 }, (_, index) => (index % 2 === 0 ? 0 - index : index));

function encode(encoding: SignalBody['encoding'], values: readonly number[] = components): string {
  const size = encoding === 'float64' ? 8 : 4;
  const bytes = Buffer.alloc(values.length * size);
  values.forEach((value, index) => {
    if (encoding === 'float64') bytes.writeDoubleLE(value, index * size);
    else if (encoding === 'float32') bytes.writeFloatLE(value, index * size);
    else bytes.writeInt32LE(value, index * size);
  });
  return bytes.toString('base64');
}

const signal: SignalBody = {
  encoding: 'float64',
  data: encode('float64'),
  sampleCount: 16,
  dwellSeconds: 0.0005,
  observeFrequencyMHz: 500.13,
};

const codesOf = (changes: Partial<SignalBody>): string[] => {
  const reading = readJsonSignal({ ...signal, ...changes });
  return reading.ok ? [] : reading.faults.map((fault) => `${fault.code} ${fault.pointer}`);
};

test.each(['float32', 'float64', 'int32'] as const)('reads little-endian %s', (encoding) => {
  expect(readJsonSignal({ ...signal, encoding, data: encode(encoding), title: 'tube 1' })).toEqual({
    ok: true,
    acquisition: {
      kind: 'fid',
      nucleus: '1H',
      title: 'tube 1',
      samples: Float64Array.from(components),
      sampleCount: 16,
      dwellSeconds: 0.0005,
      observeFrequencyMHz: 500.13,
      declared: {},
    },
  });
});

describe('refuses', () => {
  const short = encode('float64', components.slice(0, 31));
  test.each<[string, Partial<SignalBody>, string]>([
    ['fewer bytes than samples', { data: short }, 'byte-count-differs #/signal/data'],
    ['bytes of another encoding', { encoding: 'float32' }, 'byte-count-differs #/signal/data'],
    ['characters outside base64', { data: `*${signal.data.slice(1)}` }, 'unreadable-base64 #/signal/data'],
    ['base64 cut off', { data: signal.data.slice(0, -1) }, 'unreadable-base64 #/signal/data'],
    ['a NaN', { data: encode('float64', [...components.slice(1), Number.NaN]) }, 'sample-not-finite #/signal/data'],
    [
      'an infinity',
      { data: encode('float64', [-Infinity, ...components.slice(1)]) },
      'sample-not-finite #/signal/data',
    ],
    ['too few samples', { sampleCount: 15 }, 'sample-count-out-of-range #/signal/sampleCount'],
    ['too many samples', { sampleCount: 4_194_305 }, 'sample-count-out-of-range #/signal/sampleCount'],
    ['a dwell time of zero', { dwellSeconds: 0 }, 'dwell-not-positive #/signal/dwellSeconds'],
    ['an endless dwell time', { dwellSeconds: Infinity }, 'dwell-not-positive #/signal/dwellSeconds'],
    ['a negative frequency', { observeFrequencyMHz: -1 }, 'number-out-of-range #/signal/observeFrequencyMHz'],
  ])('%s', (_name, changes, code) => {
    expect(codesOf(changes)).toEqual([code]);
  });

  test('several faults at once', () => {
    expect(codesOf({ dwellSeconds: Number.NaN, observeFrequencyMHz: 0, data: '' })).toHaveLength(3);
  });
  test.each([null, 7, {}, []])('data that the schema would not let through: %j', (data) => {
    const body = JSON.parse(JSON.stringify({ ...signal, data })) as SignalBody;
    expect(readJsonSignal(body)).toMatchObject({ ok: false, faults: [{ code: 'unreadable-base64' }] });
  });
  test('an encoding that the schema would not let through', () => {
    const body = JSON.parse(JSON.stringify({ ...signal, encoding: 'toString' })) as SignalBody;
    expect(readJsonSignal(body)).toMatchObject({ ok: false, faults: [{ code: 'unsupported-encoding' }] });
  });
});
