// The lines of README.md, run as they are printed: what a newcomer copies is what this test runs.
import { execFile } from 'node:child_process';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { describeWithReferenceData } from '../reference-data.ts';
import { makeHome, type RunningStack, startStack } from './running-stack.ts';

const run = promisify(execFile);

/** Every `sh` block of the README, in order, as one script. */
async function linesOfReadme(): Promise<string> {
  const text = await readFile(new URL('../../README.md', import.meta.url), 'utf8');
  const blocks = [...text.matchAll(/^```sh\n(.*?)^```$/gms)].map(([, lines]) => lines ?? '');
  return blocks.join('\n');
}

describeWithReferenceData('README.md', (folder) => {
  let stack: RunningStack;
  let removeHome: () => Promise<void>;
  let workFolder: string;
  let printed: string;
  let result: unknown;

  beforeAll(async () => {
    const { home, remove } = await makeHome();
    removeHome = remove;
    workFolder = await mkdtemp(join(tmpdir(), 'sa-readme-'));
    stack = await startStack(home);
    const env = { PATH: process.env['PATH'], SPINASSAY_HOME: home, SPINASSAY_REFERENCE_DATA: folder };
    const script = ['set -euo pipefail', await linesOfReadme()].join('\n');
    printed = (await run('bash', ['-c', script], { cwd: workFolder, env, maxBuffer: 2 ** 24 })).stdout;
    result = JSON.parse(await readFile(join(workFolder, 'result.json'), 'utf8'));
  }, 300_000);

  afterAll(async () => {
    await stack?.stop();
    await removeHome?.();
    if (workFolder !== undefined) await rm(workFolder, { recursive: true, force: true });
  }, 60_000);

  test('leads from a method and a spectrum to a completed fit', () => {
    expect(printed.split('\n')).toContain('fit: completed');
    expect(result).toMatchObject({
      schema: 'spinassay-result/1',
      recommendation: { overall: 'releasable', reasons: [] },
    });
  });

  test('finds 4-aminobutyric acid with its three groups where they are published', () => {
    expect(result).toMatchObject({ compounds: [{ presence: { verdict: 'supported' } }] });
    // DSS scale near pH 7.4: BMRB bmse000871 (Dashti et al., Anal. Chem. 89 (2017) 12201). The sample is at pH 6 on the TSP scale, where TSP
    // lies 0.019 / (1 + 10^(5.0 - 6)) ppm below DSS: Wishart et al., J. Biomol. NMR 6 (1995) 135 (from memory). Table values carry up to 0.01 ppm.
    const published = [1.8933, 2.2861, 2.9974].map((shiftPpm) => shiftPpm + 0.019 / (1 + 10 ** -1));
    const shifts = [...printed.matchAll(/^C\dH2: (\d\.\d+) ppm, sd 0\.\d+ ppm$/gm)].map(([, value]) => Number(value));
    expect(shifts).toHaveLength(published.length);
    shifts
      .sort((a, b) => a - b)
      .forEach((shift, index) => {
        expect(Math.abs(shift - (published[index] ?? Number.NaN))).toBeLessThan(0.01);
      });
  });

  test('hands the result to whoever reads the feed', () => {
    expect(printed).toMatch(/"fitId": ?"[0-9a-f-]{36}"/);
  });
});
