import { existsSync } from 'node:fs';
import { resolve } from 'node:path';
import { describe, expect, test } from 'vitest';

const FOLDER_VARIABLE = 'SPINASSAY_REFERENCE_DATA';
const REQUIRED_VARIABLE = 'SPINASSAY_REFERENCE_DATA_REQUIRED';

/** What the gate decided: where the measured files are, why tests are skipped, or why they must fail. */
export type ReferenceDataGate =
  | { readonly kind: 'open'; readonly folder: string }
  | { readonly kind: 'skip'; readonly reason: string }
  | { readonly kind: 'fail'; readonly reason: string };

/**
 * Decide whether tests on measured files can run. The one place that knows the two variables:
 * `SPINASSAY_REFERENCE_DATA` names the folder, `SPINASSAY_REFERENCE_DATA_REQUIRED=1` turns a skip into a failure.
 */
export function referenceDataGate(
  environment: Readonly<Record<string, string | undefined>>,
  exists: (path: string) => boolean,
): ReferenceDataGate {
  const named = environment[FOLDER_VARIABLE] ?? '';
  const kind = environment[REQUIRED_VARIABLE] === '1' ? 'fail' : 'skip';
  if (named === '') return { kind, reason: `${FOLDER_VARIABLE} is not set: no folder was looked in` };
  const folder = resolve(named);
  if (!exists(resolve(folder, 'MANIFEST.csv'))) return { kind, reason: `no MANIFEST.csv in ${folder}` };
  return { kind: 'open', folder };
}

/**
 * The folder of measured files, or undefined where tests on them are to be skipped.
 *
 * @throws Error naming the folder looked in, when the files are required and missing
 */
export function referenceDataFolder(): string | undefined {
  const gate = referenceDataGate(process.env, existsSync);
  if (gate.kind === 'fail') throw new Error(gate.reason);
  return gate.kind === 'open' ? gate.folder : undefined;
}

/** A suite that runs on the measured files, is skipped aloud without them, or fails where they are required. */
export function describeWithReferenceData(name: string, define: (folder: string) => void): void {
  const gate = referenceDataGate(process.env, existsSync);
  if (gate.kind === 'open') {
    describe(name, () => define(gate.folder));
  } else if (gate.kind === 'skip') {
    describe.skip(name, () => test(`skipped: ${gate.reason}`, () => expect.unreachable()));
  } else {
    describe(name, () => test('finds the reference data', () => expect.fail(gate.reason)));
  }
}
