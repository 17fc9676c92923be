import { createHash } from 'node:crypto';
import { Client } from 'pg';
import { advisoryClass, connectionSettings, schemaName } from './connection-settings.ts';
import type { Migration } from './migrations/migration.ts';
import { migrationList } from './migrations/migration-list.ts';

/**
 * Bring the schema up to this build, step by step, each in its own transaction with its line in the ledger.
 *
 * Called by the launcher or the migration job, as the owner; services only check. Two that run at once wait for each other
 * at an advisory lock, and the second finds nothing to do.
 *
 * @throws Error when the ledger holds a step that this build does not know, or knows otherwise
 */
export async function migrate(ownerConnectionString: string): Promise<{ applied: string[]; version: number }> {
  const address = { connectionString: ownerConnectionString, applicationName: 'spinassay-migration' };
  // A step may rewrite a large table: no limit on its time.
  const client = new Client({ ...connectionSettings(address), statement_timeout: 0 });
  client.on('error', () => {}); // The statement in flight fails by itself and says why.
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1, 0)', [advisoryClass.migration]);
    await makeLedger(client);
    const pending = migrationList.slice(await countApplied(client));
    for (const migration of pending) await apply(client, migration);
    return { applied: pending.map(nameOf), version: migrationList.length };
  } finally {
    await client.end();
  }
}

/** Digest under which a step stands in the ledger. */
export function migrationDigest(migration: Migration): string {
  return createHash('sha256').update(migration.sql).digest('hex');
}

const nameOf = ({ number, name }: Migration) => `${String(number).padStart(4, '0')}-${name}`;

async function makeLedger(client: Client): Promise<void> {
  await client.query(`create schema if not exists ${schemaName}`);
  await client.query(`create table if not exists schema_migration (
    number integer primary key,
    name text not null,
    sha256 text not null,
    applied_at timestamptz not null default clock_timestamp()
  )`);
}

/** Count of steps done; refuses a ledger that tells another story than this build. */
async function countApplied(client: Client): Promise<number> {
  const { rows } = await client.query<{ number: number; name: string; sha256: string }>(
    'select number, name, sha256 from schema_migration order by number',
  );
  rows.forEach((row, index) => {
    const known = migrationList[index];
    if (known === undefined)
      throw new Error(`the database is newer than this build: it holds migration ${row.number} (${row.name})`);
    if (known.number !== row.number || migrationDigest(known) !== row.sha256) {
      throw new Error(
        `migration ${row.number} (${row.name}) was applied with another text than ${nameOf(known)} of this build`,
      );
    }
  });
  return rows.length;
}

async function apply(client: Client, migration: Migration): Promise<void> {
  await client.query('begin');
  try {
    await client.query(migration.sql);
    const entry = [migration.number, migration.name, migrationDigest(migration)];
    await client.query('insert into schema_migration (number, name, sha256) values ($1, $2, $3)', entry);
    await client.query('commit');
  } catch (error) {
    await client.query('rollback').catch(() => {}); // The cause below is what matters.
    throw new Error(`migration ${nameOf(migration)} failed and was undone`, { cause: error });
  }
}
