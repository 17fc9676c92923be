import { beforeAll, expect, test } from 'vitest';
import { type SeededLaboratory, seedLaboratory, storeForTests } from '../../test-support/index.ts';
import {
  type ClaimedJob,
  claimNext,
  countJobs,
  findFit,
  handBack,
  openWorkerSession,
  requestCancellation,
  type StoredFit,
  sweep,
  type WorkerSession,
} from '../index.ts';

const there = storeForTests();
let laboratory: SeededLaboratory;

beforeAll(async () => {
  laboratory = await seedLaboratory(there.store, 'sweeps');
});

const openWorker = () =>
  openWorkerSession(
    { connectionString: there.connectionString, applicationName: 'swept' },
    { label: 'test', wantedConcurrency: 1 },
  );

async function claim(worker: WorkerSession, leaseSeconds = 3_600): Promise<ClaimedJob> {
  const job = await claimNext(there.store, { workerId: worker.workerId, kinds: ['fit'], leaseSeconds });
  if (job === undefined) throw new Error('nothing to claim');
  return job;
}

const fitOf = ({ fence }: ClaimedJob): Promise<StoredFit | undefined> =>
  there.store.withLaboratory(fence.laboratoryId, (transaction) => findFit(transaction, fence.jobId));

/** End a worker as a kill does: its connection is gone without a word. Resolves when the worker's side has noticed. */
async function kill(worker: WorkerSession): Promise<void> {
  await there.client.query(
    `select pg_terminate_backend(pid) from pg_locks
    join worker on advisory_key = objid::bigint
    join pg_database on pg_database.oid = database and datname = current_database()
    where locktype = 'advisory' and worker.id = $1`,
    [worker.workerId],
  );
  await worker.lost;
}

test('hands back the jobs of a dead worker at once, long before their lease ends, and leaves those of a living one', async () => {
  await laboratory.askForFit('dead');
  await laboratory.askForFit('living');
  const [dead, living] = [await openWorker(), await openWorker()];
  const [deadJob, livingJob] = [await claim(dead), await claim(living)];
  await kill(dead);
  const report = await sweep(there.store);
  expect(report).toEqual({ handedBackCount: 1, failedCount: 0, waitingCount: 1 });
  expect(await fitOf(deadJob)).toMatchObject({ state: 'queued', attempt: 1 });
  expect(await fitOf(livingJob)).toMatchObject({ state: 'running', attempt: 1 });
  const again = await claim(living);
  expect(again.fence).toEqual({ ...deadJob.fence, attempt: 2 });
  await living.close();
  expect((await sweep(there.store)).handedBackCount).toBe(2);
  await clear();
});

test('hands back a job whose lease ran out although its worker lives', async () => {
  await laboratory.askForFit('hanging');
  const worker = await openWorker();
  const job = await claim(worker, 0);
  expect((await sweep(there.store)).handedBackCount).toBe(1);
  expect(await fitOf(job)).toMatchObject({ state: 'queued' });
  await worker.close();
  await clear();
});

test('fails a job that lost its last attempt with a problem, and frees its place', async () => {
  const first = await laboratory.askForFit('poison', { maxAttempts: 2 });
  const worker = await openWorker();
  // An attempt that is given back in good order does not count.
  await handBack(there.store, (await claim(worker)).fence, { isForgiven: true });
  await claim(worker, 0);
  expect(await sweep(there.store)).toMatchObject({ handedBackCount: 1, failedCount: 0 });
  const job = await claim(worker, 0);
  expect(job.fence.attempt).toBe(3);
  expect(await sweep(there.store)).toMatchObject({ handedBackCount: 0, failedCount: 1 });
  expect(await fitOf(job)).toMatchObject({ state: 'failed', problem: { slug: 'attempts-exhausted' } });
  expect((await laboratory.askForFit('poison')).id).not.toBe(first.id);
  await worker.close();
  await clear();
});

test('cancels a lost job that nobody wants any more', async () => {
  await laboratory.askForFit('unwanted');
  const worker = await openWorker();
  const job = await claim(worker, 0);
  await there.store.withLaboratory(laboratory.laboratoryId, (transaction) =>
    requestCancellation(transaction, job.fence.jobId),
  );
  expect(await sweep(there.store)).toMatchObject({ handedBackCount: 0, failedCount: 0 });
  expect(await fitOf(job)).toMatchObject({ state: 'cancelled' });
  await worker.close();
});

test('asks once for a ring for each job that nobody was woken for, and tells how long the oldest waits', async () => {
  for (let index = 0; index < 3; index += 1) await laboratory.askForFit(`waiting ${index}`);
  expect((await sweep(there.store)).waitingCount).toBe(3);
  expect((await sweep(there.store)).waitingCount).toBe(0);
  await there.client.query(`update job set dispatched_at = now() - interval '1 minute' where state = 'queued'`);
  expect((await sweep(there.store)).waitingCount).toBe(3);
  expect(await countJobs(there.store)).toMatchObject({
    queued: 3,
    running: 0,
    oldestQueuedSeconds: expect.any(Number),
  });
  await clear();
});

test('hands each of 40 lost jobs back once when 8 sweep at once', async () => {
  const worker = await openWorker();
  for (let index = 0; index < 40; index += 1) {
    await laboratory.askForFit(`lost ${index}`);
    await claim(worker);
  }
  await kill(worker);
  const reports = await Promise.all(Array.from({ length: 8 }, () => sweep(there.store)));
  expect(reports.reduce((sum, { handedBackCount }) => sum + handedBackCount, 0)).toBe(40);
});

/** Put every queued job out of the way of the next test. */
async function clear(): Promise<void> {
  await there.client.query(`update job set state = 'cancelled', finished_at = now() where state = 'queued'`);
}
