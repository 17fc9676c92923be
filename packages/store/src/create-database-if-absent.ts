import { Client, escapeIdentifier } from 'pg';

/** PostgreSQL appendix A: duplicate_database, and unique_violation when two make it at once. */
const presentCodes = new Set(['42P04', '23505']);

/** Make a database of this name on the server, unless there is one. */
export async function createDatabaseIfAbsent(
  adminConnectionString: string,
  name: string,
): Promise<'created' | 'present'> {
  const client = new Client({ connectionString: adminConnectionString, application_name: 'spinassay-migration' });
  client.on('error', () => {}); // The statement in flight fails by itself and says why.
  await client.connect();
  try {
    const { rowCount } = await client.query('select from pg_database where datname = $1', [name]);
    if (rowCount !== 0) return 'present';
    // A name cannot be a parameter; the driver's quoting is the one exception to parameters only.
    await client.query(`create database ${escapeIdentifier(name)} template template0 encoding 'UTF8'`);
    return 'created';
  } catch (error) {
    if (error instanceof Error && presentCodes.has(String(Reflect.get(error, 'code')))) return 'present';
    throw error;
  } finally {
    await client.end();
  }
}
