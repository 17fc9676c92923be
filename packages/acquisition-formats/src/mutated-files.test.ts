import { expect, test } from 'vitest';
import { fidFile } from '../test-support/fid-file.ts';
import { faultCodes } from './fault-list.ts';
import { type ReadAcquisition, readAcquisition } from './read-acquisition.ts';
import { readingLimits } from './reading-limits.ts';
import { writeAcquisition } from './write-acquisition.ts';

const MUTATED_FILE_COUNT = 2_000;
/** Pieces that mean something to a reader, so that mutations reach beyond its first check. */
const pieces = [
  '##',
  '$$',
  '\n',
  '\r',
  '=',
  ',',
  '-',
  'E+9',
  '?',
  '%',
  'Z99999999',
  'a',
  'J',
  '\0',
  '\u00b5',
  '##TITLE=',
  '##END=',
  '9e999',
  'NaN',
  '##PAGE= N=2\n##DATA TABLE= (X++(I..I)), XYDATA\n',
];

/** Linear congruential generator, constants of Numerical Recipes (1992) section 7.1; seeded, so every run is the same. */
function createDraw(seed: number): (bound: number) => number {
  let state = seed >>> 0;
  return (bound) => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return Math.floor((state / 2 ** 32) * bound);
  };
}

function mutate(text: string, draw: (bound: number) => number): string {
  let mutated = text;
  for (let count = 1 + draw(4); count > 0; count -= 1) {
    const [from, length] = [draw(mutated.length), 1 + draw(draw(2) === 0 ? 3 : 200)];
    const [head, cut, tail] = [
      mutated.slice(0, from),
      mutated.slice(from, from + length),
      mutated.slice(from + length),
    ];
    const kind = draw(5);
    if (kind === 0) mutated = head + tail;
    else if (kind === 1) mutated = head + cut + cut + tail;
    else if (kind === 2) mutated = head + (pieces[draw(pieces.length)] ?? '') + cut + tail;
    else if (kind === 3) mutated = head + String.fromCharCode(32 + draw(95)) + tail;
    else mutated = tail + head;
  }
  return mutated;
}

function sound({ samples, sampleCount, dwellSeconds, observeFrequencyMHz }: ReadAcquisition): boolean {
  return (
    samples.length === 2 * sampleCount && samples.every(Number.isFinite) && dwellSeconds > 0 && observeFrequencyMHz > 0
  );
}

test('2,000 mutated files are read soundly or refused with known faults, and nothing is thrown', () => {
  const reading = readAcquisition(fidFile());
  if (!reading.ok) throw new Error('the unmutated file must be readable');
  const originals = [
    fidFile(),
    writeAcquisition(reading.acquisition, 'affn'),
    writeAcquisition(reading.acquisition, 'difdup'),
  ];
  const known = new Set<string>(faultCodes);
  const draw = createDraw(20_260_116);
  const seen = new Set<string>();
  let readCount = 0;
  for (let index = 0; index < MUTATED_FILE_COUNT; index += 1) {
    const text = mutate(originals[index % originals.length] ?? '', draw);
    const outcome = readAcquisition(index % 2 === 0 ? text : Buffer.from(text, 'utf8'));
    if (outcome.ok) {
      readCount += 1;
      expect(sound(outcome.acquisition), text).toBe(true);
    } else {
      expect(outcome.faults.length, text).toBeGreaterThan(0);
      for (const { code } of outcome.faults) {
        expect(known.has(code), code).toBe(true);
        seen.add(code);
      }
    }
  }
  // The mutations must reach both outcomes and the depths of the reader, or this test says nothing.
  expect(readCount).toBeGreaterThan(0);
  expect(seen).toContain('y-check-failed');
  expect(seen).toContain('ordinate-check-failed');
});

test('time grows no faster than the file: long runs of what invites rescanning', () => {
  const length = 100_000;
  const limits = { ...readingLimits, lineLengthMax: Infinity, labelCountMax: Infinity };
  const started = performance.now();
  for (const run of ['##A', '##', '$', '$$', '0AJ', '0A0', '=', '\n##=', '\n##TITLE=', '1', ',', '(', ' ', '?', 'n']) {
    const long = run.repeat(length / run.length);
    expect(readAcquisition(long, limits).ok).toBe(false);
    expect(readAcquisition(fidFile(['0 1 2 3', `0 ${long}\n!\n0 1 2 3`]), limits).ok).toBe(false);
    expect(readAcquisition(fidFile(['UNITS= SECONDS', `UNITS= ${long}\nX`]), limits).ok).toBe(false);
  }
  // 45 files of 100 kB: tens of milliseconds each here; rescanning a run would take minutes.
  expect(performance.now() - started).toBeLessThan(15_000);
});
