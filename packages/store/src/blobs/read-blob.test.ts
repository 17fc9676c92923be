import { expect, test } from 'vitest';
import { seedLaboratory, storeForTests } from '../../test-support/index.ts';
import { UnknownRowError } from '../one-row.ts';
import { BlobDamagedError, readBlob } from './read-blob.ts';
import { blobDigest, writeBlob } from './write-blob.ts';

const there = storeForTests();

/** Bytes that repeat only after 65,537 places, so that chunks in the wrong order show. */
const bytesOf = (count: number) => Uint8Array.from({ length: count }, (_, index) => (index % 65_537) % 251);

// FIPS 180-4 example: SHA-256 of the three bytes "abc" (from memory).
test('names bytes by the published digest', () => {
  expect(blobDigest(new TextEncoder().encode('abc'))).toBe(
    'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad',
  );
});

test('gives bytes back as they were, whatever their count', async () => {
  const { laboratoryId } = await seedLaboratory(there.store, 'blobs');
  for (const count of [0, 1, 262_143, 262_144, 262_145, 1_500_000]) {
    const bytes = bytesOf(count);
    const sha256 = blobDigest(bytes);
    await there.store.withLaboratory(laboratoryId, (transaction) => writeBlob(transaction, sha256, bytes));
    const held = await there.store.withLaboratory(laboratoryId, (transaction) => readBlob(transaction, sha256));
    expect(Buffer.compare(held, bytes)).toBe(0);
    expect([held.byteOffset, held.buffer.byteLength]).toEqual([0, count]);
  }
});

test('keeps the same bytes once when 8 bring them at once', async () => {
  const { laboratoryId } = await seedLaboratory(there.store, 'same blobs');
  const bytes = bytesOf(300_000);
  const sha256 = blobDigest(bytes);
  const write = () => there.store.withLaboratory(laboratoryId, (transaction) => writeBlob(transaction, sha256, bytes));
  await Promise.all(Array.from({ length: 8 }, write));
  const { rowCount } = await there.client.query('select from blob_chunk where laboratory_id = $1 and sha256 = $2', [
    laboratoryId,
    sha256,
  ]);
  expect(rowCount).toBe(2);
});

test('refuses bytes that were changed, shortened or lengthened in the database', async () => {
  const { laboratoryId } = await seedLaboratory(there.store, 'damaged blobs');
  const { client } = there;
  await client.query('alter table blob_chunk disable trigger blob_chunk_is_a_fact');
  const damages = [
    `update blob_chunk set bytes = set_byte(bytes, 5, 255) where chunk_index = 1 and sha256 = $1`,
    `delete from blob_chunk where chunk_index = 1 and sha256 = $1`,
    `insert into blob_chunk select laboratory_id, sha256, 9, bytes from blob_chunk where chunk_index = 0 and sha256 = $1`,
  ];
  for (const [index, damage] of damages.entries()) {
    const bytes = bytesOf(310_000 + index);
    const sha256 = blobDigest(bytes);
    await there.store.withLaboratory(laboratoryId, (transaction) => writeBlob(transaction, sha256, bytes));
    expect((await client.query(damage, [sha256])).rowCount).toBe(1);
    const reading = there.store.withLaboratory(laboratoryId, (transaction) => readBlob(transaction, sha256));
    await expect(reading).rejects.toThrow(BlobDamagedError);
  }
  await client.query('alter table blob_chunk enable trigger blob_chunk_is_a_fact');
});

test('knows no bytes of another laboratory', async () => {
  const mine = await seedLaboratory(there.store, 'blobs of one');
  const other = await seedLaboratory(there.store, 'blobs of another');
  const bytes = bytesOf(10);
  const sha256 = blobDigest(bytes);
  await there.store.withLaboratory(mine.laboratoryId, (transaction) => writeBlob(transaction, sha256, bytes));
  const reading = there.store.withLaboratory(other.laboratoryId, (transaction) => readBlob(transaction, sha256));
  await expect(reading).rejects.toThrow(UnknownRowError);
});
