import { createHash } from 'node:crypto';
import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';

/** 1 MiB in one value took 16-19 ms to insert and stalled the event loop for 87 ms; smaller chunks let others in between. */
const chunkBytesMax = 262_144;

/** Digest under which bytes are kept. */
export function blobDigest(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex');
}

/** Keep bytes under their digest; bytes that are held already are not written again. */
export async function writeBlob(transaction: LaboratoryTransaction, sha256: string, bytes: Uint8Array): Promise<void> {
  const { laboratoryId, [sqlDoor]: sql } = transaction;
  // A second writer of the same bytes waits here for the first one's commit, and then writes nothing.
  const made = await sql.query(
    `insert into blob (laboratory_id, sha256, byte_count) values ($1, $2, $3)
    on conflict do nothing returning sha256`,
    [laboratoryId, sha256, bytes.byteLength],
  );
  if (made.length === 0) return;
  for (let start = 0; start < bytes.byteLength; start += chunkBytesMax) {
    const chunk = Buffer.from(bytes.subarray(start, start + chunkBytesMax));
    await sql.query('insert into blob_chunk (laboratory_id, sha256, chunk_index, bytes) values ($1, $2, $3, $4)', [
      laboratoryId,
      sha256,
      start / chunkBytesMax,
      chunk,
    ]);
  }
}
