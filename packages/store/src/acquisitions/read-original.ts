import { readBlob } from '../blobs/read-blob.ts';
import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';

export type OriginalBytes = { readonly mediaType: string; readonly sha256: string; readonly bytes: Uint8Array };

/**
 * The bytes of an acquisition as they came; undefined when the laboratory has no such acquisition.
 *
 * @throws BlobDamagedError when they have changed since
 */
export async function readOriginal(transaction: LaboratoryTransaction, id: string): Promise<OriginalBytes | undefined> {
  const [row] = await transaction[sqlDoor].query<{ original_media_type: string; original_blob_sha256: string }>(
    'select original_media_type, original_blob_sha256 from acquisition where laboratory_id = $1 and id = $2',
    [transaction.laboratoryId, id],
  );
  if (row === undefined) return undefined;
  const bytes = await readBlob(transaction, row.original_blob_sha256);
  return { mediaType: row.original_media_type, sha256: row.original_blob_sha256, bytes };
}
