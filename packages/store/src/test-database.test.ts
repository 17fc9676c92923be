import { Client } from 'pg';
import { expect, test } from 'vitest';
import { createTestDatabase } from '../test-support/index.ts';

test('fails the test file that left a connection behind, by the name of the connection', async () => {
  const database = await createTestDatabase();
  const client = new Client({ connectionString: database.connectionString, application_name: 'forgotten' });
  client.on('error', () => {}); // The forced drop cuts it.
  await client.connect();
  await expect(database.drop()).rejects.toThrow('left 1 connections open: forgotten');
});

test('gives each test file a database of its own', async () => {
  const [a, b] = [await createTestDatabase(), await createTestDatabase()];
  expect(a.connectionString).not.toBe(b.connectionString);
  await a.drop();
  await b.drop();
});
