import { LATEST_SCHEMA_VERSION, runMigrations } from 'bullmq';
import { Client } from 'pg';
import { bellSchema } from './bell-schema.ts';

/**
 * Bring the tables behind the bell up to this build. Called by the launcher or the migration job, as the owner; services only check.
 * Concurrent calls wait for each other at an advisory lock.
 *
 * @returns the version of the tables
 * @throws Error when the tables are newer than this build
 */
export async function migrateBell(ownerConnectionString: string): Promise<number> {
  const client = new Client({ connectionString: ownerConnectionString, application_name: 'spinassay-migration' });
  client.on('error', () => {}); // The statement in flight fails by itself and says why.
  await client.connect();
  try {
    const version = await runMigrations(client, bellSchema);
    if (version > LATEST_SCHEMA_VERSION) {
      throw new Error(`the bell's tables are at version ${version}, this build knows ${LATEST_SCHEMA_VERSION}`);
    }
    return version;
  } finally {
    await client.end();
  }
}
