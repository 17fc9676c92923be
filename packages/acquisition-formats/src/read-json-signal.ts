import type { SignalBody } from '@spinassay/contract';
import { type FaultCode, FaultList } from './fault-list.ts';
import type { ReadAcquisition, Reading } from './read-acquisition.ts';
import { type ReadingLimits, readingLimits } from './reading-limits.ts';

const OBSERVE_FREQUENCY_MAX_MHZ = 2_500;

/** Bytes and reading of one component in each encoding, little-endian. */
const encodings: Readonly<Record<SignalBody['encoding'], Encoding>> = {
  float32: { byteCount: 4, read: (view, offset) => view.getFloat32(offset, true) },
  float64: { byteCount: 8, read: (view, offset) => view.getFloat64(offset, true) },
  int32: { byteCount: 4, read: (view, offset) => view.getInt32(offset, true) },
};

type Encoding = { readonly byteCount: number; readonly read: (view: DataView, offset: number) => number };

/**
 * Read a signal given as numbers: base64 (RFC 4648 section 4) of interleaved re, im components, little-endian.
 * Takes nothing on trust from the schema, so that it may be used without it; every fault is returned at once.
 * Pointers are those of a body that holds the signal as its member `signal`.
 */
export function readJsonSignal(signal: SignalBody, limits: ReadingLimits = readingLimits): Reading {
  const faults = new FaultList(limits.faultCountMax);
  checkScales(signal, limits, faults);
  const samples = readSamples(signal, limits, faults);
  if (samples === undefined || !faults.isEmpty) return { ok: false, faults: faults.toArray() };
  const acquisition: ReadAcquisition = {
    kind: 'fid',
    nucleus: '1H',
    ...(signal.title === undefined ? {} : { title: signal.title }),
    samples,
    sampleCount: signal.sampleCount,
    dwellSeconds: signal.dwellSeconds,
    observeFrequencyMHz: signal.observeFrequencyMHz,
    declared: {},
  };
  return { ok: true, acquisition };
}

function checkScales(signal: SignalBody, limits: ReadingLimits, faults: FaultList): void {
  const { dwellSeconds, observeFrequencyMHz, sampleCount } = signal;
  if (!(dwellSeconds > 0 && dwellSeconds < Infinity)) {
    report(faults, 'dwell-not-positive', 'dwellSeconds', `expected dwellSeconds > 0, got ${dwellSeconds}`);
  }
  if (!(observeFrequencyMHz > 0 && observeFrequencyMHz <= OBSERVE_FREQUENCY_MAX_MHZ)) {
    const detail = `expected observeFrequencyMHz > 0, <= ${OBSERVE_FREQUENCY_MAX_MHZ}, got ${observeFrequencyMHz}`;
    report(faults, 'number-out-of-range', 'observeFrequencyMHz', detail);
  }
  if (signal.nucleus !== undefined && signal.nucleus !== '1H') {
    report(faults, 'wrong-nucleus', 'nucleus', `the nucleus is "${String(signal.nucleus)}"; only 1H is analysed`);
  }
  if (!isWithinLimits(sampleCount, limits)) {
    const detail = `expected ${limits.sampleCountMin} to ${limits.sampleCountMax} samples, got ${sampleCount}`;
    report(faults, 'sample-count-out-of-range', 'sampleCount', detail);
  }
}

function isWithinLimits(count: number, limits: ReadingLimits): boolean {
  return Number.isInteger(count) && count >= limits.sampleCountMin && count <= limits.sampleCountMax;
}

/** (2 sampleCount) interleaved re, im */
function readSamples(signal: SignalBody, limits: ReadingLimits, faults: FaultList): Float64Array | undefined {
  const encoding = Object.hasOwn(encodings, signal.encoding) ? encodings[signal.encoding] : undefined;
  if (encoding === undefined) {
    const detail = `the encoding is "${signal.encoding}"; expected ${Object.keys(encodings).join(', ')}`;
    report(faults, 'unsupported-encoding', 'encoding', detail);
    return undefined;
  }
  if (!isWithinLimits(signal.sampleCount, limits)) return undefined;
  const expected = 2 * signal.sampleCount * encoding.byteCount;
  const bytes = decodeBase64(signal.data, expected, faults);
  if (bytes === undefined) return undefined;
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const samples = new Float64Array(2 * signal.sampleCount);
  for (let index = 0; index < samples.length; index += 1) {
    samples[index] = encoding.read(view, index * encoding.byteCount);
  }
  const bad = samples.findIndex((value) => !Number.isFinite(value));
  if (bad === -1) return samples;
  const detail = `sample ${Math.floor(bad / 2)} holds ${samples[bad]}; every component must be a finite number`;
  report(faults, 'sample-not-finite', 'data', detail);
  return undefined;
}

/** Decode canonical base64 of exactly the expected length; anything else is a fault. */
function decodeBase64(data: unknown, byteCount: number, faults: FaultList): Uint8Array | undefined {
  if (typeof data !== 'string') {
    report(faults, 'unreadable-base64', 'data', 'data is not a text; expected base64 (RFC 4648 section 4)');
    return undefined;
  }
  // Checked first, so that a wrong length is named as such and nothing oversized is decoded.
  const padding = data.endsWith('==') ? 2 : data.endsWith('=') ? 1 : 0;
  const held = Math.floor((data.length * 3) / 4) - padding;
  if (data.length % 4 === 0 && held !== byteCount) {
    const detail = `data holds ${held} bytes; sampleCount and encoding ask for ${byteCount}`;
    report(faults, 'byte-count-differs', 'data', detail);
    return undefined;
  }
  const bytes = data.length % 4 === 0 ? Buffer.from(data, 'base64') : undefined;
  if (bytes !== undefined && bytes.toString('base64') === data) return bytes;
  report(faults, 'unreadable-base64', 'data', 'data is not base64 with padding (RFC 4648 section 4)');
  return undefined;
}

function report(faults: FaultList, code: FaultCode, member: keyof SignalBody, detail: string): void {
  faults.add(code, detail, { pointer: `#/signal/${member}` });
}
