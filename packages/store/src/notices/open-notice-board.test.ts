import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SeededLaboratory, seedLaboratory, storeForTests } from '../../test-support/index.ts';
import { type NoticeBoard, type NoticeTopic, openNoticeBoard, requestCancellation } from '../index.ts';

const there = storeForTests();
let board: NoticeBoard;
let laboratory: SeededLaboratory;

beforeAll(async () => {
  laboratory = await seedLaboratory(there.store, 'notices');
  board = openNoticeBoard({ connectionString: there.connectionString, applicationName: 'board' });
  await board.ready();
});
afterAll(() => board.close());

/** The next notice of a topic, as a promise. */
function next(topic: NoticeTopic, id: string): Promise<string> {
  return new Promise((resolve) => {
    const stop = board.watch(topic, id, (noticed) => {
      stop();
      resolve(noticed);
    });
  });
}

test('tells the watchers of a fit, and those of all fits, once it has changed', async () => {
  const fit = await laboratory.askForFit('watched');
  const [one, any, cancel] = [next('fit', fit.id), next('fit', '*'), next('cancel', '*')];
  await there.store.withLaboratory(laboratory.laboratoryId, (transaction) => requestCancellation(transaction, fit.id));
  expect(await Promise.all([one, any, cancel])).toEqual([fit.id, fit.id, fit.id]);
});

test('tells nothing of a transaction that was rolled back, nor of another fit', async () => {
  const [undone, done] = [await laboratory.askForFit('undone'), await laboratory.askForFit('done')];
  const told: string[] = [];
  const stop = board.watch('fit', undone.id, (id) => told.push(id));
  const undoing = there.store.withLaboratory(laboratory.laboratoryId, async (transaction) => {
    await requestCancellation(transaction, undone.id);
    throw new Error('undone');
  });
  await expect(undoing).rejects.toThrow('undone');
  // Notices arrive in order: once the later one is here, the earlier one will not come.
  const later = next('fit', done.id);
  await there.store.withLaboratory(laboratory.laboratoryId, (transaction) => requestCancellation(transaction, done.id));
  await later;
  expect(told).toEqual([]);
  stop();
});

test('listens again after its connection was cut, and calls every watcher, who may have missed something', async () => {
  const missed = next('feed', laboratory.laboratoryId);
  await there.client.query(`select pg_terminate_backend(pid) from pg_stat_activity
    where application_name = 'board' and datname = current_database()`);
  expect(await missed).toBe(laboratory.laboratoryId);
  const fit = await laboratory.askForFit('after the cut');
  const again = next('fit', fit.id);
  await there.store.withLaboratory(laboratory.laboratoryId, (transaction) => requestCancellation(transaction, fit.id));
  expect(await again).toBe(fit.id);
});
