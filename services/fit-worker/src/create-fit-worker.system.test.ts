import { readFeed, readResult, requestCancellation } from '@spinassay/store';
import { Client } from 'pg';
import { afterEach, expect, test } from 'vitest';
import { workerFixture } from '../test-support/worker-fixture.ts';

const fixture = workerFixture();
const started: { end(): Promise<void> }[] = [];
afterEach(async () => {
  await Promise.all(started.splice(0).map((worker) => worker.end()));
});

function startWorker(options?: Parameters<typeof fixture.startWorker>[0]) {
  const worker = fixture.startWorker(options);
  started.push(worker);
  return worker;
}

/** Long enough for a sweep that comes every two seconds, on a machine that does other things too. */
const patience = { timeout: 20_000 };
const cancel = (id: string) =>
  fixture.store.withLaboratory(fixture.laboratoryId, (transaction) => requestCancellation(transaction, id));
const stateOf = async (id: string) => (await fixture.readFit(id)).state;

test('takes up a fit when the bell rings and stores one result with its feed event', async () => {
  startWorker();
  const { id } = await fixture.askForFit('answer');
  await fixture.bell.ring();
  await expect.poll(() => stateOf(id), patience).toBe('completed');
  const { store, laboratoryId } = fixture;
  await store.withLaboratory(laboratoryId, async (transaction) => {
    const result = await readResult(transaction, id);
    expect(JSON.parse(result?.text ?? '')).toMatchObject({ schema: 'spinassay-result/1', engineVersion: 'made-up' });
    const events = (await readFeed(transaction, { after: 0, limit: 100 })).filter(({ fitId }) => fitId === id);
    expect(events.map(({ recommendation }) => recommendation)).toEqual(['held']);
  });
});

test('takes up a fit that no bell told of', async () => {
  startWorker();
  const { id } = await fixture.askForFit('answer');
  await expect.poll(() => stateOf(id), patience).toBe('completed');
});

test('stores the problem of a fit that fails and goes on with the next', async () => {
  const { logged } = startWorker();
  const [refused, faulty] = [await fixture.askForFit('refuse the inputs'), await fixture.askForFit('fail')];
  const { id } = await fixture.askForFit('answer');
  await expect.poll(() => stateOf(id), patience).toBe('completed');
  expect(await fixture.readFit(refused.id)).toMatchObject({
    state: 'failed',
    problem: { slug: 'analysis-not-possible', detail: 'Declare the carrier.' },
  });
  const { problem } = await fixture.readFit(faulty.id);
  expect(problem?.slug).toBe('analysis-failed');
  expect(problem?.detail).not.toContain('inner detail');
  expect(logged()).toContain('inner detail');
});

test('runs as many fits at once as it may, tells how far they are, and cancels one without touching the other', async () => {
  startWorker({ concurrency: 2 });
  const fits = [];
  for (let count = 0; count < 3; count += 1) fits.push(await fixture.askForFit('work until told to stop'));
  const [first, second, third] = fits.map(({ id }) => id) as [string, string, string];
  await expect.poll(async () => (await fixture.readFit(second)).stage, patience).toBe('made-up-stage');
  expect(await Promise.all([stateOf(first), stateOf(second), stateOf(third)])).toEqual([
    'running',
    'running',
    'queued',
  ]);
  expect(await cancel(first)).toBe('requested');
  await expect.poll(() => stateOf(first), patience).toBe('cancelled');
  await expect.poll(() => stateOf(third), patience).toBe('running');
  expect(await stateOf(second)).toBe('running');
  await Promise.all([cancel(second), cancel(third)]);
  await expect
    .poll(async () => [await stateOf(second), await stateOf(third)], patience)
    .toEqual(['cancelled', 'cancelled']);
});

test('hands back what it cannot finish when it is told to leave, and another worker takes it up at once', async () => {
  const leaving = fixture.startWorker({ label: 'leaving' });
  const { id } = await fixture.askForFit('work and never listen');
  await expect.poll(() => stateOf(id), patience).toBe('running');
  await leaving.end();
  expect(await fixture.readFit(id)).toMatchObject({ state: 'queued', attempt: 1 });
  startWorker({ label: 'staying' });
  await expect.poll(async () => (await fixture.readFit(id)).attempt, patience).toBe(2);
  // It does not listen: its thread is ended under it.
  await cancel(id);
  await expect.poll(() => stateOf(id), patience).toBe('cancelled');
});

test('gives up a fit that was given to another, and goes on, when it loses the connection that shows it is alive', async () => {
  const { logged } = startWorker({ label: 'cut-off' });
  const { id } = await fixture.askForFit('work until told to stop');
  await expect.poll(() => stateOf(id), patience).toBe('running');
  const client = new Client({ connectionString: fixture.connectionString });
  await client.connect();
  // The session holds the worker's lock; the pool of the store has another name.
  await client.query(`select pg_terminate_backend(pid) from pg_stat_activity where application_name = 'cut-off'`);
  await client.end();
  // Its own next sweep finds the lock free and hands the fit back; its new session takes it up again.
  await expect.poll(async () => (await fixture.readFit(id)).attempt, patience).toBeGreaterThan(1);
  await expect.poll(logged, patience).toContain('fit-taken-away');
  const next = await fixture.askForFit('answer');
  await cancel(id);
  await expect.poll(() => stateOf(next.id), patience).toBe('completed');
});
