import { afterAll, beforeAll, expect, test } from 'vitest';
import { digestOf, type SeededLaboratory, seedLaboratory, storeForTests } from '../../test-support/index.ts';
import {
  claimNext,
  type Fence,
  FencedError,
  findFit,
  handBack,
  type LaboratoryTransaction,
  openWorkerSession,
  readFeed,
  readResult,
  recordCancelled,
  recordCompleted,
  recordFailed,
  renewLease,
  requestCancellation,
  type WorkerSession,
} from '../index.ts';

const there = storeForTests();
let worker: WorkerSession;
let laboratory: SeededLaboratory;

beforeAll(async () => {
  const address = { connectionString: there.connectionString, applicationName: 'recorder' };
  worker = await openWorkerSession(address, { label: 'test', wantedConcurrency: 1 });
  laboratory = await seedLaboratory(there.store, 'records');
});
afterAll(() => worker.close());

const resultText = '{"schema":"spinassay-result/1","shift":1e-7}';
const completed = {
  resultText,
  resultSha256: digestOf(resultText),
  engineVersion: '0.1.0',
  numericsId: 'n1',
  recommendation: 'held',
  timings: { computeSeconds: 1.5 },
} as const;
const problem = { slug: 'analysis-failed', detail: 'made up' } as const;

async function claimed(label: string): Promise<Fence> {
  const asked = await laboratory.askForFit(label);
  const job = await claimNext(there.store, { workerId: worker.workerId, kinds: ['fit'], leaseSeconds: 60 });
  if (job?.fence.jobId !== asked.id) throw new Error('another job was in the way');
  return job.fence;
}
const read = <T>(work: (transaction: LaboratoryTransaction) => Promise<T>) =>
  there.store.withLaboratory(laboratory.laboratoryId, work);
const count = async (table: string, fitId: string) =>
  (
    await there.client.query(`select from ${table} where ${table === 'audit' ? 'subject' : 'fit_id'}::text = $1`, [
      fitId,
    ])
  ).rowCount;

test('records state, result, audit and feed event together, and gives the text back byte for byte', async () => {
  const fence = await claimed('together');
  await recordCompleted(there.store, fence, completed);
  const fit = await read((transaction) => findFit(transaction, fence.jobId));
  expect(fit).toMatchObject({ state: 'completed', attempt: 1, resultSha256: completed.resultSha256 });
  expect(await read((transaction) => readResult(transaction, fence.jobId))).toMatchObject({
    text: resultText,
    numericsId: 'n1',
  });
  const feed = await read((transaction) => readFeed(transaction, { after: 0, limit: 10 }));
  expect(feed.at(-1)).toMatchObject({
    kind: 'result',
    fitId: fence.jobId,
    recommendation: 'held',
    methodId: 'made-up',
  });
  expect(await count('audit', fence.jobId)).toBe(2);
});

test('rolls all of it back when the job was handed to another attempt', async () => {
  const fence = await claimed('fenced');
  await handBack(there.store, fence, { isForgiven: true });
  const next = await claimNext(there.store, { workerId: worker.workerId, kinds: ['fit'], leaseSeconds: 60 });
  expect(next?.fence).toMatchObject({ jobId: fence.jobId, attempt: 2 });
  await expect(recordCompleted(there.store, fence, completed)).rejects.toThrow(FencedError);
  await expect(recordFailed(there.store, fence, { problem })).rejects.toThrow(FencedError);
  await expect(handBack(there.store, fence, { isForgiven: true })).rejects.toThrow(FencedError);
  expect(await renewLease(there.store, fence, { leaseSeconds: 60, stage: 'late' })).toBe('fenced');
  expect([await count('result', fence.jobId), await count('feed_event', fence.jobId)]).toEqual([0, 0]);
  const fit = await read((transaction) => findFit(transaction, fence.jobId));
  expect(fit).toMatchObject({ state: 'running', attempt: 2 });
  expect(fit?.stage).toBeUndefined();
});

test('stores one result when 8 finish the same attempt at once', async () => {
  const fence = await claimed('eight');
  const outcomes = await Promise.allSettled(
    Array.from({ length: 8 }, () => recordCompleted(there.store, fence, completed)),
  );
  expect(outcomes.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
  expect([await count('result', fence.jobId), await count('feed_event', fence.jobId)]).toEqual([1, 1]);
});

test('writes nothing when the digest is not that of the text', async () => {
  const fence = await claimed('digest');
  const wrong = { ...completed, resultSha256: digestOf('something else') };
  await expect(recordCompleted(there.store, fence, wrong)).rejects.toThrow(/check constraint/);
  expect(await read((transaction) => findFit(transaction, fence.jobId))).toMatchObject({ state: 'running' });
  await recordFailed(there.store, fence, { problem });
  expect(await read((transaction) => findFit(transaction, fence.jobId))).toMatchObject({ state: 'failed', problem });
});

test('cancels a running job only when somebody asked', async () => {
  const fence = await claimed('cancelled');
  await expect(recordCancelled(there.store, fence)).rejects.toThrow(FencedError);
  expect(await read((transaction) => requestCancellation(transaction, fence.jobId))).toBe('requested');
  expect(await renewLease(there.store, fence, { leaseSeconds: 60 })).toBe('cancel-requested');
  await recordCancelled(there.store, fence);
  expect(await read((transaction) => requestCancellation(transaction, fence.jobId))).toBe('already-final');
});

test('raises the revision for news, not for a renewed lease', async () => {
  const fence = await claimed('revision');
  const revision = async () => (await read((transaction) => findFit(transaction, fence.jobId)))?.revision ?? 0;
  const before = await revision();
  await renewLease(there.store, fence, { leaseSeconds: 60 });
  expect(await revision()).toBe(before);
  await renewLease(there.store, fence, { leaseSeconds: 60, stage: 'search', fraction: 0.25 });
  expect(await revision()).toBe(before + 1);
});
