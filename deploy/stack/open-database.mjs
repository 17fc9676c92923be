import { join } from 'node:path';
import { migrateBell } from '@spinassay/job-queue';
import { createDatabaseIfAbsent, migrate } from '@spinassay/store';
import { findPostgres, socketFolderFor, startPostgres } from '../postgres/index.mjs';

const databaseName = 'spinassay';

/**
 * A migrated database: the one that `databaseUrl` names, or one of our own in the home folder.
 *
 * @returns {Promise<{url: string, description: string, stop(): Promise<void>}>} `stop` leaves a database that is not ours alone
 */
export async function openDatabase({ databaseUrl, home, engine: prefer }) {
  const database =
    databaseUrl === undefined
      ? await startOwn({ home, prefer })
      : { url: databaseUrl, description: 'the PostgreSQL of DATABASE_URL', stop: async () => {} };
  try {
    await migrate(database.url);
    await migrateBell(database.url);
  } catch (error) {
    await database.stop();
    throw error;
  }
  return database;
}

async function startOwn({ home, prefer }) {
  const dataFolder = join(home, 'database');
  const engine = await findPostgres({ prefer, dataFolder });
  const server = await startPostgres({ engine, dataFolder, socketFolder: await socketFolderFor(home) });
  try {
    await createDatabaseIfAbsent(server.connectionStringFor('postgres'), databaseName);
  } catch (error) {
    await server.stop();
    throw error;
  }
  return {
    url: server.connectionStringFor(databaseName),
    description: `PostgreSQL ${engine.version} (${engine.kind}), data in ${dataFolder}`,
    stop: () => server.stop(),
  };
}
