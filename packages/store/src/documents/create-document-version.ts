import { writeAudit } from '../audit/write-audit.ts';
import { advisoryClass } from '../connection-settings.ts';
import { oneRow } from '../one-row.ts';
import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';
import { findDocument } from './find-document.ts';
import { type DocumentKind, type DocumentRow, type StoredDocument, storedDocument } from './stored-document.ts';

export type NewDocument = {
  readonly kind: DocumentKind;
  readonly id: string;
  readonly name: string;
  /** Canonical JSON; `sha256` is over it, which the database checks. */
  readonly bodyText: string;
  readonly sha256: string;
};

/**
 * Write version 1 of a document or its next version; a body equal to the latest is `unchanged` and writes nothing.
 *
 * Writers of the same document queue at an advisory lock, so versions are dense and no two hold the same number.
 */
export async function createDocumentVersion(
  transaction: LaboratoryTransaction,
  document: NewDocument,
): Promise<{ outcome: 'created' | 'unchanged'; document: StoredDocument }> {
  const { laboratoryId, [sqlDoor]: sql } = transaction;
  const { kind, id, name, bodyText, sha256 } = document;
  // A statement of its own: the reading after it must see what the holder before us committed.
  await sql.query('select pg_advisory_xact_lock($1, hashtext($2))', [
    advisoryClass.document,
    `${laboratoryId} ${kind} ${id}`,
  ]);
  const latest = await findDocument(transaction, { kind, id });
  if (latest?.sha256 === sha256) return { outcome: 'unchanged', document: latest };
  const rows = await sql.query<DocumentRow>(
    `insert into document (laboratory_id, kind, id, version, name, body_text, sha256) values ($1, $2, $3, $4, $5, $6, $7)
    returning kind, id, version, name, body_text, sha256, created_at`,
    [laboratoryId, kind, id, (latest?.version ?? 0) + 1, name, bodyText, sha256],
  );
  const created = storedDocument(oneRow(rows, `${kind} ${id}`));
  await writeAudit(sql, {
    laboratoryId,
    action: `${kind}-version-created`,
    subject: id,
    detail: { version: created.version },
  });
  return { outcome: 'created', document: created };
}
