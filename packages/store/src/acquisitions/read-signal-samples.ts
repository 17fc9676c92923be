import { endianness } from 'node:os';
import { readBlob } from '../blobs/read-blob.ts';
import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';

/**
 * The samples of an acquisition, interleaved re, im (2 x sampleCount); undefined when the laboratory has no such acquisition.
 *
 * @throws BlobDamagedError when the bytes have changed since
 */
export async function readSignalSamples(
  transaction: LaboratoryTransaction,
  id: string,
): Promise<Float64Array | undefined> {
  const [row] = await transaction[sqlDoor].query<{ signal_blob_sha256: string }>(
    'select signal_blob_sha256 from acquisition where laboratory_id = $1 and id = $2',
    [transaction.laboratoryId, id],
  );
  if (row === undefined) return undefined;
  const bytes = await readBlob(transaction, row.signal_blob_sha256);
  // The stored form is little-endian; `swap64` turns it round in place where the machine is not.
  if (endianness() === 'BE') Buffer.from(bytes.buffer).swap64();
  return new Float64Array(bytes.buffer);
}
