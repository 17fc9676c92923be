import { stat } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { findPostgres } from '../../deploy/postgres/index.mjs';
import { askForInventedFit, untilRunning } from './invented-sample.ts';
import { endLaunchers, launch, makeHome, processesOf, startStack, stillRunning } from './running-stack.ts';

let home: string;
let remove: () => Promise<void>;
beforeEach(async () => {
  ({ home, remove } = await makeHome());
});
// A test that failed has left its launcher running.
afterEach(async () => {
  await endLaunchers();
  await remove();
});

const commandsOf = async () => (await processesOf(home, undefined)).map(({ command }) => command);
const engines = ['installed', 'embedded'] as const;

for (const engine of engines) {
  const isThere = await findPostgres({ prefer: engine }).then(
    () => true,
    () => false,
  );
  test.runIf(isThere)(
    `serves with the ${engine} PostgreSQL, leaves no process at Ctrl-C, and finds its data again`,
    async () => {
      const environment = { SPINASSAY_POSTGRES: engine };
      const first = await startStack(home, environment);
      expect(first.printed()).toContain(`(${engine})`);
      expect((await fetch(`${first.access.baseUrl}/readyz`)).status).toBe(200);
      expect((await stat(join(home, 'access.json'))).mode & 0o777).toBe(0o600);
      const children = await processesOf(home, first.process.pid);
      expect(children.length).toBeGreaterThanOrEqual(3);
      const body = {
        name: 'TSP',
        panel: [{ compoundId: 'ethanol' }],
        reference: { compoundId: 'ethanol' },
        claims: ['shifts'],
      };
      await first.post('method-owner', '/v1/methods', { id: 'kept', body });
      first.process.kill('SIGINT');
      expect(await first.ended).toBe(0);
      expect(await commandsOf()).toEqual([]);
      expect(await stillRunning(children)).toEqual([]);

      const second = await startStack(home, environment);
      expect(second.access.keys).toEqual(first.access.keys);
      expect(JSON.parse(await second.read('analyst', '/v1/methods/kept'))).toMatchObject({ id: 'kept', version: 1 });
      await second.stop();
    },
  );
}

test('names the launcher that holds the home folder, and touches nothing', async () => {
  const first = await startStack(home);
  const second = launch(home);
  expect(await second.ended).toBe(1);
  expect(second.printed()).toContain(`another launcher (process ${first.process.pid}) runs with ${home}`);
  expect((await fetch(`${first.access.baseUrl}/readyz`)).status).toBe(200);
  await first.stop();
});

test('leaves at once at a second signal, and leaves nothing', async () => {
  const stack = await startStack(home);
  const id = await askForInventedFit(stack, 21);
  await untilRunning(stack, id);
  const children = await processesOf(home, stack.process.pid);
  stack.process.kill('SIGINT');
  await expect.poll(stack.printed).toContain('stopping (SIGINT)');
  // Within half a second it would pass for the echo of the first, which npm makes.
  await expect
    .poll(() => stack.process.kill('SIGINT') && stack.printed(), { timeout: 10_000 })
    .toContain('leaving at once');
  expect(await stack.ended).toBe(1);
  await expect.poll(() => stillRunning(children), { timeout: 20_000 }).toEqual([]);
});

test('is not survived by its services when it is killed, and goes on with the database that was', async () => {
  const first = await startStack(home);
  const services = (await processesOf(home, first.process.pid)).filter(({ command }) =>
    command.includes('/dist/main.js'),
  );
  expect(services).toHaveLength(2);
  first.process.kill('SIGKILL');
  await expect.poll(() => stillRunning(services), { timeout: 20_000 }).toEqual([]);
  const second = await startStack(home);
  expect(second.access.keys).toEqual(first.access.keys);
  await second.stop();
  expect(await commandsOf()).toEqual([]);
});

test.each([
  [{ PORT: 'http' }, 'PORT: expected a whole number from 0 to 65535, got "http"'],
  [{ SPINASSAY_POSTGRES: 'borrowed' }, 'expected SPINASSAY_POSTGRES to be "installed" or "embedded", got "borrowed"'],
  [{ SPINASSAY_HOTS: '::' }, 'did you mean SPINASSAY_HOST?'],
] as const)('says what is wrong with %o and leaves nothing', async (environment, expected) => {
  const started = launch(home, environment);
  expect(await started.ended).toBe(1);
  expect(started.printed()).toContain(expected);
  expect(await commandsOf()).toEqual([]);
});
