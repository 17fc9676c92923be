import { randomBytes } from 'node:crypto';
import { Client, escapeIdentifier } from 'pg';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { createTestDatabase, type TestDatabase } from '../test-support/index.ts';
import { createDatabaseIfAbsent, migrate } from './index.ts';
import { migrationList } from './migrations/migration-list.ts';

let database: TestDatabase;
beforeAll(async () => {
  database = await createTestDatabase();
});
afterAll(() => database.drop());

async function run(sql: string): Promise<unknown[]> {
  const client = new Client({ connectionString: database.connectionString, options: '-c search_path=spinassay' });
  await client.connect();
  try {
    return (await client.query(sql)).rows;
  } finally {
    await client.end();
  }
}

test('says of every migration whether the release before can go on with it, and why', () => {
  expect(migrationList.length).toBeGreaterThan(0);
  for (const [index, { number, sql }] of migrationList.entries()) {
    expect(number).toBe(index + 1);
    expect(sql).toMatch(/^-- (compatible|breaking): \S.{10,}\n/);
  }
});

test('applies nothing to a database that is current', async () => {
  expect(await migrate(database.connectionString)).toEqual({ applied: [], version: migrationList.length });
});

test('applies every migration once when 4 migrate an empty database at once', async () => {
  await run('drop schema spinassay cascade');
  const outcomes = await Promise.all(Array.from({ length: 4 }, () => migrate(database.connectionString)));
  expect(outcomes.map(({ applied }) => applied.length).sort()).toEqual([0, 0, 0, migrationList.length]);
});

test('refuses a database whose migrations were other ones, or more', async () => {
  await run(`update schema_migration set sha256 = repeat('0', 64) where number = 2`);
  await expect(migrate(database.connectionString)).rejects.toThrow(/applied with another text/);
  await run('drop schema spinassay cascade');
  await migrate(database.connectionString);
  await run(`insert into schema_migration values (99, 'of the future', '')`);
  await expect(migrate(database.connectionString)).rejects.toThrow(/newer than this build/);
});

test('makes a database once when 4 ask for it at once', async () => {
  const name = `spinassay test "${randomBytes(6).toString('hex')}"`;
  const asked = await Promise.all(
    Array.from({ length: 4 }, () => createDatabaseIfAbsent(database.connectionString, name)),
  );
  expect(asked.sort()).toEqual(['created', 'present', 'present', 'present']);
  expect(await createDatabaseIfAbsent(database.connectionString, name)).toBe('present');
  await run(`drop database ${escapeIdentifier(name)}`);
});
