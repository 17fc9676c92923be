import { Client } from 'pg';
import { afterAll, beforeAll } from 'vitest';
import { openStore, type Store } from '../src/index.ts';
import { createTestDatabase, type TestDatabase } from './create-test-database.ts';

export type StoreForTests = {
  readonly store: Store;
  readonly connectionString: string;
  /** A connection of its own, for looking and for doing what the store would not. */
  readonly client: Client;
};

/** A store on a database of its own for one test file; registers the hooks that make and end it. Read the fields inside tests only. */
export function storeForTests(poolSize = 12): StoreForTests {
  let database: TestDatabase | undefined;
  let store: Store | undefined;
  let client: Client | undefined;
  beforeAll(async () => {
    database = await createTestDatabase();
    const { connectionString } = database;
    store = openStore({ connectionString, applicationName: 'store-test', poolSize });
    client = new Client({ connectionString, application_name: 'test-looks', options: '-c search_path=spinassay' });
    await client.connect();
  });
  afterAll(async () => {
    await client?.end();
    await store?.close();
    await database?.drop();
  });
  return {
    get store() {
      return made(store);
    },
    get connectionString() {
      return made(database).connectionString;
    },
    get client() {
      return made(client);
    },
  };
}

function made<T>(value: T | undefined): T {
  if (value === undefined) throw new Error('the store of a test file is there inside its tests only');
  return value;
}
