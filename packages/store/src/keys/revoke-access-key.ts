import { writeAudit } from '../audit/write-audit.ts';
import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';

/** Withdraw a key at once and for ever. False when the laboratory has no such key in force. */
export async function revokeAccessKey(transaction: LaboratoryTransaction, keyId: string): Promise<boolean> {
  const { laboratoryId, [sqlDoor]: sql } = transaction;
  const rows = await sql.query(
    `update access_key set revoked_at = clock_timestamp()
    where laboratory_id = $1 and id = $2 and revoked_at is null returning id`,
    [laboratoryId, keyId],
  );
  if (rows.length === 0) return false;
  await writeAudit(sql, { laboratoryId, action: 'access-key-revoked', subject: keyId });
  return true;
}
