import { randomBytes } from 'node:crypto';
import { createConnection } from 'node:net';
import { text } from 'node:stream/consumers';
import { Client } from 'pg';
import { inject } from 'vitest';
import { connectionStringFor, type TestServer } from './one-postgres.ts';

export type TestDatabase = {
  readonly connectionString: string;
  /** Remove the database. @throws Error naming the connections that the test file left open */
  drop(): Promise<void>;
};

/** A connection that was closed takes the server a moment to forget; one that was not is still there after all of these looks. */
const lookCountMax = 100;
const secondsBetweenLooks = 0.02;

/** A migrated database for one test file, cloned from the run's template. Make it in `beforeAll`, drop it in `afterAll`. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const { adminConnectionString, template } = await askForServer();
  const name = `spinassay_test_${randomBytes(6).toString('hex')}`;
  await asAdmin(adminConnectionString, async (admin) => {
    await admin.query(`create database ${name} template ${admin.escapeIdentifier(template)}`);
  });
  return {
    connectionString: connectionStringFor(adminConnectionString, name),
    drop: () => asAdmin(adminConnectionString, (admin) => dropDatabase(admin, name)),
  };
}

async function askForServer(): Promise<TestServer> {
  const answer = JSON.parse(await text(createConnection(inject('testPostgresSocket')))) as
    | TestServer
    | { failure: string };
  if ('failure' in answer) throw new Error(answer.failure);
  return answer;
}

async function asAdmin<T>(connectionString: string, work: (admin: Client) => Promise<T>): Promise<T> {
  const admin = new Client({ connectionString });
  await admin.connect();
  try {
    return await work(admin);
  } finally {
    await admin.end();
  }
}

async function dropDatabase(admin: Client, name: string): Promise<void> {
  const left = await connectionsLeft(admin, name);
  await admin.query(`drop database ${name} with (force)`);
  if (left.length > 0) throw new Error(`the test file left ${left.length} connections open: ${left.join(', ')}`);
}

async function connectionsLeft(admin: Client, name: string): Promise<string[]> {
  let left: string[] = [];
  for (let look = 0; look < lookCountMax; look += 1) {
    const { rows } = await admin.query<{ application_name: string }>(
      `select application_name from pg_stat_activity where datname = $1 and backend_type = 'client backend'`,
      [name],
    );
    left = rows.map((row) => row.application_name || 'unnamed');
    if (left.length === 0) break;
    await admin.query('select pg_sleep($1)', [secondsBetweenLooks]);
  }
  return left;
}
