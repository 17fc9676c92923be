import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, type Server } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Client } from 'pg';
import type { TestProject } from 'vitest/node';
import { findPostgres, type PostgresServer, startPostgres } from '../../../deploy/postgres/index.mjs';
import { createDatabaseIfAbsent } from '../src/create-database-if-absent.ts';
import { migrate } from '../src/migrate.ts';

/** Where a test file finds the server: an address that may make databases, and the migrated template to clone. */
export type TestServer = { readonly adminConnectionString: string; readonly template: string };

declare module 'vitest' {
  export interface ProvidedContext {
    /** Path of the Unix socket that tells the `TestServer` as JSON. */
    testPostgresSocket: string;
  }
}

/**
 * One PostgreSQL for the whole test run, started when the first test file asks for it and stopped after the last: this process is its
 * direct parent and reaps it. DATABASE_URL, where it is set, names a running server instead.
 *
 * The runner calls this once; test files ask over a private Unix socket.
 */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const folder = await mkdtemp(join(tmpdir(), 'sa-'));
  let running: Promise<RunningServer> | undefined;
  const listener = createServer((socket) => {
    running ??= start(folder);
    running
      .then(({ address }) => socket.end(JSON.stringify(address)))
      .catch((error: unknown) => socket.end(JSON.stringify({ failure: String(error) })));
    socket.on('error', () => {}); // A test file that died; there is nobody left to answer.
  });
  const socketPath = join(folder, 'ask');
  await new Promise<void>((resolve) => listener.listen(socketPath, resolve));
  project.provide('testPostgresSocket', socketPath);
  return async () => {
    await closeListener(listener);
    await (await running?.catch(() => undefined))?.stop();
    await rm(folder, { recursive: true, force: true });
  };
}

const closeListener = (listener: Server) => new Promise<void>((resolve) => listener.close(() => resolve()));

type RunningServer = { readonly address: TestServer; stop(): Promise<void> };

async function start(folder: string): Promise<RunningServer> {
  const given = process.env['DATABASE_URL'];
  const server = given === undefined || given === '' ? await startPrivate(folder) : undefined;
  const adminConnectionString = server?.connectionStringFor('postgres') ?? String(given);
  // Named after the process: a shared server may serve several runs at once.
  const template = `spinassay_template_${process.pid}`;
  await createDatabaseIfAbsent(adminConnectionString, template);
  await migrate(connectionStringFor(adminConnectionString, template));
  return {
    address: { adminConnectionString, template },
    stop: () => server?.stop() ?? dropTemplate(adminConnectionString, template),
  };
}

async function startPrivate(folder: string): Promise<PostgresServer> {
  const engine = await findPostgres({ prefer: process.env['SPINASSAY_POSTGRES'] });
  // Nothing here outlives the run, so nothing waits for the disk.
  const settings = { fsync: 'off', synchronous_commit: 'off', full_page_writes: 'off' };
  return startPostgres({ engine, dataFolder: join(folder, 'data'), socketFolder: join(folder, 's'), settings });
}

async function dropTemplate(adminConnectionString: string, template: string): Promise<void> {
  const client = new Client({ connectionString: adminConnectionString });
  await client.connect();
  await client.query(`drop database if exists ${client.escapeIdentifier(template)}`);
  await client.end();
}

/** The same server, another database. Works for `postgresql://user@/name?host=...` as for the usual form. */
export function connectionStringFor(adminConnectionString: string, database: string): string {
  return adminConnectionString.replace(/^([a-z]+:\/\/[^/]*\/)[^?]*/, `$1${encodeURIComponent(database)}`);
}
