import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { describeWithReferenceData, referenceDataGate } from '../../../tests/reference-data.ts';
import { type ReadAcquisition, readAcquisition } from './read-acquisition.ts';
import { writeAcquisition } from './write-acquisition.ts';

// Expected figures are those of MANIFEST.csv in the folder of measured files, written by whoever made the folder.
type ManifestRow = Readonly<Record<string, string>>;

/** Rows of a CSV text by their heading; quoted fields may hold commas and doubled quotes (RFC 4180). */
function parseCsv(text: string): ManifestRow[] {
  const [heading = [], ...rows] = text
    .trim()
    .split(/\r?\n/)
    .map((line) =>
      Array.from(line.matchAll(/(?:^|,)(?:"((?:[^"]|"")*)"|([^,]*))/g), ([, quoted, plain]) =>
        quoted === undefined ? (plain ?? '') : quoted.replaceAll('""', '"'),
      ),
    );
  return rows.map((row) => Object.fromEntries(heading.map((name, index) => [name, row[index] ?? ''])));
}

function scalesOf({ samples: _, ...scales }: ReadAcquisition): Omit<ReadAcquisition, 'samples'> {
  return scales;
}

describeWithReferenceData('every measured file', (folder) => {
  const manifest = parseCsv(readFileSync(join(folder, 'MANIFEST.csv'), 'utf8'));
  const fids = manifest.filter((row) => row['data_type'] === 'NMR FID');
  const fileOf = (row: ManifestRow): Buffer => readFileSync(join(folder, row['file'] ?? ''));

  test('is in the manifest, and both kinds are there', () => {
    const names = readdirSync(folder, { recursive: true, encoding: 'utf8' });
    const files = names.filter((name) => name.endsWith('.jdx')).map((name) => name.replaceAll('\\', '/'));
    expect(files.sort()).toEqual(manifest.map((row) => row['file']).sort());
    expect(fids.length).toBeGreaterThan(0);
    expect(fids.length).toBeLessThan(manifest.length);
  });

  test.each(fids.map((row) => [row['file'], row] as const))('%s reads as its row says', (_file, row) => {
    const reading = readAcquisition(fileOf(row));
    if (!reading.ok) expect.fail(JSON.stringify(reading.faults));
    const { acquisition } = reading;
    expect(acquisition.sampleCount).toBe(Number(row['points']));
    expect(acquisition.observeFrequencyMHz).toBe(Number(row['obs_MHz']));
    expect(acquisition.title).toBe(row['title']);
    expect(acquisition.declared).toMatchObject({
      solvent: row['solvent'],
      recycleDelaySeconds: Number(row['recycle_delay_s']),
      scanCount: Number(row['scans']),
      timeZeroSampleIndex: Number(row['time_zero_point']),
    });
    expect(acquisition.declared).not.toHaveProperty('sequence');
    // Widths are printed to 1e-8 Hz (3e-12 of the narrowest), steps to 12 significant digits or more.
    expect(Math.abs(acquisition.dwellSeconds * Number(row['sw_Hz']) - 1)).toBeLessThan(1e-11);
  });

  test.each(fids.map((row) => [row['file'], row] as const))('%s survives both ways of writing', (_file, row) => {
    const reading = readAcquisition(fileOf(row));
    if (!reading.ok) expect.fail(JSON.stringify(reading.faults));
    for (const form of ['affn', 'difdup'] as const) {
      const again = readAcquisition(writeAcquisition(reading.acquisition, form));
      if (!again.ok) expect.fail(JSON.stringify(again.faults));
      const { samples, ...scales } = again.acquisition;
      expect(scales).toEqual(scalesOf(reading.acquisition));
      expect(Buffer.from(samples.buffer).equals(Buffer.from(reading.acquisition.samples.buffer))).toBe(true);
    }
  });

  const others = manifest.filter((row) => row['data_type'] !== 'NMR FID');
  test.each(others.map((row) => [row['file'], row] as const))('%s is refused as processed', (_file, row) => {
    expect(readAcquisition(fileOf(row))).toMatchObject({ ok: false, faults: [{ code: 'processed-spectrum' }] });
  });

  test('loses a line loudly', () => {
    const lines = fileOf(fids[0] ?? {})
      .toString('utf8')
      .split('\n');
    const table = lines.findIndex((line) => line.startsWith('##DATA TABLE'));
    const reading = readAcquisition([...lines.slice(0, table + 50), ...lines.slice(table + 51)].join('\n'));
    expect(reading).toMatchObject({ ok: false });
    expect(reading.ok ? [] : reading.faults.map((fault) => fault.code)).toContain('x-check-failed');
  });
});

describe('the gate to measured files', () => {
  const folder = process.platform === 'win32' ? 'C:\\measured' : '/measured';
  const gate = (named: string | undefined, required: string | undefined, doesExist: boolean) =>
    referenceDataGate(
      { SPINASSAY_REFERENCE_DATA: named, SPINASSAY_REFERENCE_DATA_REQUIRED: required },
      () => doesExist,
    );
  test('opens where the folder holds a manifest', () => {
    expect(gate(folder, '1', true)).toEqual({ kind: 'open', folder });
  });
  test('skips and says why where the folder is not named or empty', () => {
    expect(gate(undefined, undefined, true)).toMatchObject({ kind: 'skip', reason: /is not set/ });
    expect(gate(folder, undefined, false)).toMatchObject({ kind: 'skip' });
  });
  test('fails naming the folder looked in where the files are required', () => {
    const closed = gate(folder, '1', false);
    expect(closed.kind === 'fail' ? closed.reason : '').toContain(folder);
    expect(gate(undefined, '1', false).kind).toBe('fail');
  });
});
