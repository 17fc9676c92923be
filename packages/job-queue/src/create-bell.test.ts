import { createTestDatabase, type TestDatabase } from '@spinassay/store/test-support';
import { Client } from 'pg';
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest';
import { type Bell, createBell, migrateBell } from './index.ts';

let database: TestDatabase;
const open: Bell[] = [];
const faults: Error[] = [];

beforeAll(async () => {
  database = await createTestDatabase();
  await migrateBell(database.connectionString);
});

// A bell that still listened would take the rings of the next test.
afterEach(async () => {
  for (const bell of open.splice(0)) await bell.close();
});

afterAll(() => database.drop());

function makeBell(applicationName: string): Bell {
  const { connectionString } = database;
  const bell = createBell({ connectionString, applicationName, onFault: (error) => faults.push(error) });
  open.push(bell);
  return bell;
}

/** Resolves when `heard` was called `count` times. */
function hearing(count: number): { heard: () => void; all: Promise<void> } {
  let left = count;
  let finish = () => {};
  const all = new Promise<void>((resolve) => {
    finish = resolve;
  });
  return {
    heard: () => {
      left -= 1;
      if (left === 0) finish();
    },
    all,
  };
}

test('migrates again without a change', async () => {
  const version = await migrateBell(database.connectionString);
  expect(version).toBeGreaterThan(0);
  expect(await migrateBell(database.connectionString)).toBe(version);
});

test('wakes a listener for every ring, keeps no ring, and stays within its connections', async () => {
  const ringing = makeBell('bell-ringing');
  const listening = makeBell('bell-listening');
  const { heard, all } = hearing(200);
  await listening.listen(heard);
  const rings = Promise.all(Array.from({ length: 200 }, () => ringing.ring()));
  await rings;
  await all;
  const counts = await withClient(async (client) => {
    const left = await client.query('select from bullmq.job');
    const { rows } = await client.query<{ name: string; count: number }>(
      `select coalesce(nullif(application_name, ''), 'unnamed') as name, count(*)::integer as count from pg_stat_activity
      where datname = current_database() and pid <> pg_backend_pid() and backend_type = 'client backend' group by 1 order by 1`,
    );
    return { left: left.rowCount, rows };
  });
  console.info('connections of two bells after 200 rings', JSON.stringify(counts.rows));
  const total = counts.rows.reduce((sum, { count }) => sum + count, 0);
  expect(total).toBeLessThanOrEqual(2 * 3);
  // The last ring may still be on its way out of the table.
  expect(counts.left).toBeLessThanOrEqual(1);
});

test('goes on listening after the server cut every connection', async () => {
  const bell = makeBell('bell-cut');
  const before = hearing(1);
  let heard = before.heard;
  await bell.listen(() => heard());
  await bell.ring();
  await before.all;
  await withClient((client) =>
    client.query(
      'select pg_terminate_backend(pid) from pg_stat_activity where datname = current_database() and pid <> pg_backend_pid()',
    ),
  );
  const after = hearing(1);
  heard = after.heard;
  // A ring that meets the cut is lost, as the sweep of the store expects; one of the next is heard.
  const ringAgain = setInterval(() => bell.ring().catch(() => {}), 50);
  await after.all;
  clearInterval(ringAgain);
  expect(faults.length).toBeGreaterThan(0);
});

test('says so when the tables are not there', async () => {
  const bare = await createTestDatabase();
  const bell = createBell({ connectionString: bare.connectionString, applicationName: 'bell-bare', onFault: () => {} });
  await expect(bell.ring()).rejects.toThrow(/not initialized/);
  await bell.close();
  await bare.drop();
});

async function withClient<T>(work: (client: Client) => Promise<T>): Promise<T> {
  const client = new Client({ connectionString: database.connectionString });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}
