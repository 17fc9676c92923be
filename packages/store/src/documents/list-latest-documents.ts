import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';
import {
  type DocumentHeading,
  type DocumentHeadingRow,
  type DocumentKind,
  documentHeading,
} from './stored-document.ts';

/** The latest version of every document of a kind, without bodies, in order of the bytes of the id. */
export async function listLatestDocuments(
  transaction: LaboratoryTransaction,
  kind: DocumentKind,
): Promise<DocumentHeading[]> {
  const rows = await transaction[sqlDoor].query<DocumentHeadingRow>(
    `select distinct on (id) kind, id, version, name, sha256, created_at from document
    where laboratory_id = $1 and kind = $2 order by id, version desc`,
    [transaction.laboratoryId, kind],
  );
  return rows.map(documentHeading);
}
