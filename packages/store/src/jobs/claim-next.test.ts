import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SeededLaboratory, seedLaboratory, storeForTests } from '../../test-support/index.ts';
import { claimNext, handBack, openWorkerSession, type WorkerSession } from '../index.ts';

const there = storeForTests();
let worker: WorkerSession;
let laboratory: SeededLaboratory;

beforeAll(async () => {
  const address = { connectionString: there.connectionString, applicationName: 'claimer' };
  worker = await openWorkerSession(address, { label: 'test', wantedConcurrency: 1 });
  laboratory = await seedLaboratory(there.store, 'claims');
});
afterAll(() => worker.close());

const claim = () => claimNext(there.store, { workerId: worker.workerId, kinds: ['fit'], leaseSeconds: 60 });

test('claims each of 200 jobs once under 12 claimers at once, and then none', async () => {
  const asked: string[] = [];
  for (let index = 0; index < 200; index += 1) asked.push((await laboratory.askForFit(`many ${index}`)).id);
  const claimed: string[] = [];
  const claimer = async () => {
    for (let job = await claim(); job !== undefined; job = await claim()) claimed.push(job.fence.jobId);
  };
  await Promise.all(Array.from({ length: 12 }, claimer));
  expect([...claimed].sort()).toEqual(asked.sort());
});

test('gives the job that waited longest first', async () => {
  const first = await laboratory.askForFit('first');
  await laboratory.askForFit('second');
  expect((await claim())?.fence).toMatchObject({ jobId: first.id, attempt: 1, laboratoryId: laboratory.laboratoryId });
  await claim();
});

test('leaves a job alone that is to wait, and takes it up again with the next attempt once it is due', async () => {
  const asked = await laboratory.askForFit('later');
  const job = await claim();
  if (job === undefined) throw new Error('nothing to claim');
  await handBack(there.store, job.fence, { delaySeconds: 3_600, isForgiven: false });
  expect(await claim()).toBeUndefined();
  await there.client.query('update job set not_before = clock_timestamp() where id = $1', [asked.id]);
  expect((await claim())?.fence).toEqual({ jobId: asked.id, attempt: 2, laboratoryId: laboratory.laboratoryId });
});
