import { afterAll, beforeAll, expect, test } from 'vitest';
import {
  createTestDatabase,
  type SeededLaboratory,
  seedLaboratory,
  type TestDatabase,
} from '../../test-support/index.ts';
import { claimNext, handBack, openStore, openWorkerSession, type Store, type WorkerSession } from '../index.ts';

let database: TestDatabase;
let store: Store;
let worker: WorkerSession;
let laboratory: SeededLaboratory;

beforeAll(async () => {
  database = await createTestDatabase();
  const address = { connectionString: database.connectionString, applicationName: 'claim-next-test' };
  store = openStore({ ...address, poolSize: 12 });
  worker = await openWorkerSession(address, { label: 'test', wantedConcurrency: 1 });
  laboratory = await seedLaboratory(store, 'claims');
});

afterAll(async () => {
  await worker.close();
  await store.close();
  await database.drop();
});

const claim = () => claimNext(store, { workerId: worker.workerId, kinds: ['fit'], leaseSeconds: 60 });

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

test('leaves a job alone that is to wait', async () => {
  await laboratory.askForFit('later');
  const job = await claim();
  if (job === undefined) throw new Error('nothing to claim');
  await handBack(store, job.fence, { delaySeconds: 3_600, isForgiven: false });
  expect(await claim()).toBeUndefined();
});
