import { oneRow } from '../one-row.ts';
import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';
import { blobDigest } from './write-blob.ts';

/** The bytes held are not the bytes that were taken in. Nothing may be computed or shown from them. */
export class BlobDamagedError extends Error {
  override readonly name = 'BlobDamagedError';
  readonly sha256: string;

  constructor(sha256: string, found: string) {
    super(`expected bytes with SHA-256 ${sha256}, the store holds ${found}`);
    this.sha256 = sha256;
  }
}

/**
 * Bytes by their digest, which is checked on every read.
 *
 * @throws UnknownRowError when the laboratory holds no such bytes
 * @throws BlobDamagedError when they have changed since they were written
 */
export async function readBlob(transaction: LaboratoryTransaction, sha256: string): Promise<Uint8Array> {
  const { laboratoryId, [sqlDoor]: sql } = transaction;
  const address = [laboratoryId, sha256];
  const heads = await sql.query<{ byte_count: number }>(
    'select byte_count from blob where laboratory_id = $1 and sha256 = $2',
    address,
  );
  const { byte_count: byteCount } = oneRow(heads, `blob ${sha256}`);
  const chunks = await sql.query<{ bytes: Buffer }>(
    'select bytes from blob_chunk where laboratory_id = $1 and sha256 = $2 order by chunk_index',
    address,
  );
  // An own ArrayBuffer, from its first byte on: the caller may look at it as Float64Array.
  const bytes = new Uint8Array(byteCount);
  let end = 0;
  for (const chunk of chunks) {
    if (end + chunk.bytes.length > byteCount) throw new BlobDamagedError(sha256, `more than ${byteCount} bytes`);
    bytes.set(chunk.bytes, end);
    end += chunk.bytes.length;
  }
  const found = blobDigest(bytes);
  if (end !== byteCount || found !== sha256)
    throw new BlobDamagedError(sha256, `${end} of ${byteCount} bytes with ${found}`);
  return bytes;
}
