import { expect, test } from 'vitest';
import { digestOf, type SeededLaboratory, seedLaboratory, storeForTests } from '../../test-support/index.ts';
import { claimNext, openWorkerSession, readFeed, recordCompleted } from '../index.ts';

const there = storeForTests(14);
const writerCount = 12;
const fitCount = 240;

const resultText = '{}';
const completed = {
  resultText,
  resultSha256: digestOf(resultText),
  engineVersion: '0',
  numericsId: 'n',
  recommendation: 'releasable',
} as const;

const page = (laboratory: SeededLaboratory, after: number, limit = 7) =>
  there.store.withLaboratory(laboratory.laboratoryId, (transaction) => readFeed(transaction, { after, limit }));

test('misses none of 240 results of 12 writers, read by cursor while they are written', async () => {
  const laboratory = await seedLaboratory(there.store, 'feed');
  const asked: string[] = [];
  for (let index = 0; index < fitCount; index += 1) asked.push((await laboratory.askForFit(`fit ${index}`)).id);
  const address = { connectionString: there.connectionString, applicationName: 'writer' };
  const worker = await openWorkerSession(address, { label: 'test', wantedConcurrency: writerCount });
  const write = async () => {
    for (;;) {
      const job = await claimNext(there.store, { workerId: worker.workerId, kinds: ['fit'], leaseSeconds: 60 });
      if (job === undefined) return;
      await recordCompleted(there.store, job.fence, completed);
    }
  };
  const seen: { sequence: number; fitId: string }[] = [];
  const read = async () => {
    let after = 0;
    while (seen.length < fitCount) {
      const events = await page(laboratory, after);
      seen.push(...events);
      after = events.at(-1)?.sequence ?? after;
    }
  };
  await Promise.all([read(), ...Array.from({ length: writerCount }, write)]);
  expect(seen.map(({ sequence }) => sequence)).toEqual(Array.from({ length: fitCount }, (_, index) => index + 1));
  expect(seen.map(({ fitId }) => fitId).sort()).toEqual(asked.sort());
  await worker.close();
}, 60_000);

test('gives an empty page at the end and to another laboratory', async () => {
  const laboratory = await seedLaboratory(there.store, 'empty feed');
  expect(await page(laboratory, 0)).toEqual([]);
});
