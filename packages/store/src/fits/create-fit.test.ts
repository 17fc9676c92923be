import { expect, test } from 'vitest';
import { digestOf, seedLaboratory, storeForTests } from '../../test-support/index.ts';
import { createFit, findFit, loadFitInputs, requestCancellation, UnknownRowError } from '../index.ts';

const there = storeForTests();

test('takes the same fit once when 8 ask at once', async () => {
  const laboratory = await seedLaboratory(there.store, 'once');
  const asked = await Promise.all(Array.from({ length: 8 }, () => laboratory.askForFit('same')));
  expect(new Set(asked.map(({ id }) => id)).size).toBe(1);
  expect(asked[0]).toMatchObject({ state: 'queued', attempt: 0, cancelRequested: false, seed: '18446744073709551615' });
});

test('gives the place of a cancelled fit to the next who asks, and keeps the first', async () => {
  const laboratory = await seedLaboratory(there.store, 'freed');
  const first = await laboratory.askForFit('again');
  await there.store.withLaboratory(laboratory.laboratoryId, async (transaction) => {
    expect(await requestCancellation(transaction, first.id)).toBe('cancelled');
  });
  const second = await laboratory.askForFit('again');
  expect(second.id).not.toBe(first.id);
  await there.store.withLaboratory(laboratory.laboratoryId, async (transaction) => {
    expect(await findFit(transaction, first.id)).toMatchObject({ state: 'cancelled' });
  });
});

test('keeps the same key of two laboratories apart', async () => {
  const [mine, other] = [await seedLaboratory(there.store, 'key one'), await seedLaboratory(there.store, 'key two')];
  const [a, b] = [await mine.askForFit('key'), await other.askForFit('key')];
  expect(a.id).not.toBe(b.id);
  await there.store.withLaboratory(other.laboratoryId, async (transaction) => {
    expect(await findFit(transaction, a.id)).toBeUndefined();
    expect(await requestCancellation(transaction, a.id)).toBeUndefined();
  });
});

test('refuses a fit of what is not held, another laboratory included, and leaves no job behind', async () => {
  const mine = await seedLaboratory(there.store, 'refers');
  const other = await seedLaboratory(there.store, 'is referred to');
  const before = await there.client.query('select from job');
  await expect(mine.askForFit('a', { acquisitionId: other.acquisitionId })).rejects.toThrow(UnknownRowError);
  await expect(mine.askForFit('b', { methodVersion: 2 })).rejects.toThrow(UnknownRowError);
  await expect(mine.askForFit('c', { preparationId: 'made-up', preparationVersion: 1 })).rejects.toThrow(
    UnknownRowError,
  );
  expect((await there.client.query('select from job')).rowCount).toBe(before.rowCount);
});

test('loads every input at the version that the fit names', async () => {
  const laboratory = await seedLaboratory(there.store, 'inputs');
  const fit = await laboratory.askForFit('inputs', { repeatReason: 'shim', optionsText: '{"x":1}' });
  const inputs = await there.store.withLaboratory(laboratory.laboratoryId, (transaction) =>
    loadFitInputs(transaction, fit.id),
  );
  expect(inputs).toMatchObject({
    fit: { id: fit.id, repeatReason: 'shim', optionsText: '{"x":1}', inputSha256: digestOf('input inputs') },
    acquisition: { id: laboratory.acquisitionId, conditions: { version: 1 } },
    method: { id: 'made-up', version: 1, bodyText: '{"panel":[]}' },
  });
  expect([...inputs.samples]).toEqual([1, 0, 0.5, -0.25, 0.25, 0.125, 1e-7, -1e-300]);
  expect(inputs.preparation).toBeUndefined();
});

test('asks nothing when the transaction that asked is rolled back', async () => {
  const laboratory = await seedLaboratory(there.store, 'rolled back');
  const asking = there.store.withLaboratory(laboratory.laboratoryId, async (transaction) => {
    await createFit(transaction, {
      acquisitionId: laboratory.acquisitionId,
      conditionsVersion: 1,
      methodId: 'made-up',
      methodVersion: 1,
      optionsText: '{}',
      naturalKey: digestOf('gone'),
      inputSha256: digestOf('gone'),
      seed: '0',
    });
    throw new Error('thought better of it');
  });
  await expect(asking).rejects.toThrow('thought better of it');
  expect((await there.client.query('select from job where natural_key = $1', [digestOf('gone')])).rowCount).toBe(0);
});
