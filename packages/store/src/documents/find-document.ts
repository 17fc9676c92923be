import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';
import { type DocumentKind, type DocumentRow, type StoredDocument, storedDocument } from './stored-document.ts';

/** Which document; the latest version when none is named. */
export type DocumentAddress = { readonly kind: DocumentKind; readonly id: string; readonly version?: number };

/** One version of a document of the laboratory. */
export async function findDocument(
  transaction: LaboratoryTransaction,
  { kind, id, version }: DocumentAddress,
): Promise<StoredDocument | undefined> {
  const [row] = await transaction[sqlDoor].query<DocumentRow>(
    `select kind, id, version, name, body_text, sha256, created_at from document
    where laboratory_id = $1 and kind = $2 and id = $3 and ($4::integer is null or version = $4)
    order by version desc limit 1`,
    [transaction.laboratoryId, kind, id, version ?? null],
  );
  return row === undefined ? undefined : storedDocument(row);
}
