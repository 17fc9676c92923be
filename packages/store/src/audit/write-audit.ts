import type { Sql } from '../sql-door.ts';

export type AuditEntry = {
  readonly laboratoryId: string;
  /** What was done, past tense, kebab-case. */
  readonly action: string;
  /** Id of what it was done to. */
  readonly subject: string;
  readonly detail?: Readonly<Record<string, string | number>>;
};

/**
 * Write one plain row of the audit trail in the transaction at hand. Sealing rows into a chain is for a later step of its own:
 * a chain written here would be a second hot row and a deadlock.
 */
export async function writeAudit(sql: Sql, { laboratoryId, action, subject, detail = {} }: AuditEntry): Promise<void> {
  await sql.query('insert into audit (laboratory_id, action, subject, detail) values ($1, $2, $3, $4)', [
    laboratoryId,
    action,
    subject,
    JSON.stringify(detail),
  ]);
}
