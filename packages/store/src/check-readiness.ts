import { migrationDigest } from './migrate.ts';
import { migrationList } from './migrations/migration-list.ts';
import { type Store, sqlDoor } from './sql-door.ts';

export type StoreReadiness = {
  readonly databaseAnswers: boolean;
  readonly migrationsCurrent: boolean;
  /** For an operator; holds no address and no secret. */
  readonly detail: string;
};

/** PostgreSQL appendix A: undefined_table and invalid_schema_name. */
const noLedgerCodes = new Set(['42P01', '3F000']);

/** Whether the database answers and holds exactly the migrations of this build. Never throws. */
export async function checkReadiness(store: Store): Promise<StoreReadiness> {
  try {
    const rows = await store[sqlDoor].query<{ sha256: string }>('select sha256 from schema_migration order by number');
    const isCurrent =
      rows.length === migrationList.length &&
      migrationList.every((known, index) => migrationDigest(known) === rows[index]?.sha256);
    const detail = isCurrent
      ? 'answers'
      : `holds ${rows.length} migrations, this build expects its own ${migrationList.length}`;
    return { databaseAnswers: true, migrationsCurrent: isCurrent, detail };
  } catch (error) {
    const code = error instanceof Error ? String(Reflect.get(error, 'code')) : '';
    if (noLedgerCodes.has(code))
      return { databaseAnswers: true, migrationsCurrent: false, detail: 'holds no migrations' };
    return { databaseAnswers: false, migrationsCurrent: false, detail: 'does not answer' };
  }
}
