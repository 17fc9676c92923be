import { expect, test } from 'vitest';
import { madeUpAcquisition, seedLaboratory, storeForTests } from '../../test-support/index.ts';
import { createAcquisition, findAcquisition, readOriginal, readSignalSamples } from '../index.ts';

const there = storeForTests();

test('gives a signal back with every number and byte as it came', async () => {
  const { laboratoryId } = await seedLaboratory(there.store, 'bytes');
  const brought = madeUpAcquisition('brought');
  const { outcome, acquisition } = await there.store.withLaboratory(laboratoryId, (transaction) =>
    createAcquisition(transaction, brought),
  );
  expect(outcome).toBe('created');
  expect(acquisition).toMatchObject({
    signalSha256: brought.signal.sha256,
    dwellSeconds: brought.signal.dwellSeconds,
    observeFrequencyMHz: 600.13282,
    title: 'brought',
    original: { mediaType: 'chemical/x-jcamp-dx', byteCount: brought.original.bytes.byteLength },
    conditions: { version: 1, ...brought.conditions },
  });
  await there.store.withLaboratory(laboratoryId, async (transaction) => {
    expect(await findAcquisition(transaction, acquisition.id)).toEqual(acquisition);
    const samples = await readSignalSamples(transaction, acquisition.id);
    expect(new Uint8Array(samples?.buffer ?? new ArrayBuffer(0))).toEqual(brought.signal.bytes);
    expect((await readOriginal(transaction, acquisition.id))?.bytes).toEqual(brought.original.bytes);
  });
});

test('takes a signal in once when 8 bring it at once, and shows all of them the same acquisition', async () => {
  const { laboratoryId } = await seedLaboratory(there.store, 'once');
  const bring = () =>
    there.store.withLaboratory(laboratoryId, (transaction) => createAcquisition(transaction, madeUpAcquisition('x8')));
  const brought = await Promise.all(Array.from({ length: 8 }, bring));
  expect(brought.filter(({ outcome }) => outcome === 'created')).toHaveLength(1);
  expect(new Set(brought.map(({ acquisition }) => acquisition.id)).size).toBe(1);
});

test('writes nothing for a known signal and shows the conditions that are held', async () => {
  const { laboratoryId } = await seedLaboratory(there.store, 'known');
  const first = madeUpAcquisition('known signal');
  const second = {
    ...first,
    original: { bytes: Uint8Array.of(1, 2, 3), mediaType: 'application/json' },
    conditions: { ...first.conditions, declaredText: '{"pH":7}' },
  };
  const bring = (acquisition: typeof first) =>
    there.store.withLaboratory(laboratoryId, (transaction) => createAcquisition(transaction, acquisition));
  const held = await bring(first);
  const count = async () =>
    (await there.client.query('select from blob where laboratory_id = $1', [laboratoryId])).rowCount;
  const before = await count();
  expect(await bring(second)).toEqual({ outcome: 'known', acquisition: held.acquisition });
  expect(await count()).toBe(before);
});

test('knows nothing of the signals of another laboratory', async () => {
  const mine = await seedLaboratory(there.store, 'mine');
  const other = await seedLaboratory(there.store, 'other');
  await there.store.withLaboratory(other.laboratoryId, async (transaction) => {
    expect(await findAcquisition(transaction, mine.acquisitionId)).toBeUndefined();
    expect(await readOriginal(transaction, mine.acquisitionId)).toBeUndefined();
    expect(await readSignalSamples(transaction, mine.acquisitionId)).toBeUndefined();
    expect((await createAcquisition(transaction, madeUpAcquisition('mine'))).outcome).toBe('created');
  });
});
