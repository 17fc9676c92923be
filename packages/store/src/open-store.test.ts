import { expect, test } from 'vitest';
import { createTestDatabase, seedLaboratory, storeForTests } from '../test-support/index.ts';
import { checkReadiness, isStoreUnavailable, openStore } from './index.ts';
import { sqlDoor } from './sql-door.ts';

const there = storeForTests();
const nobody = '00000000-0000-0000-0000-000000000000';

test('tells every statement which laboratory it works for, and forgets it afterwards', async () => {
  const single = openStore({ connectionString: there.connectionString, applicationName: 'single', poolSize: 1 });
  const look = `select current_setting('app.lab', true) as lab, current_setting('transaction_isolation') as isolation`;
  const inside = await single.withLaboratory(nobody, (transaction) => transaction[sqlDoor].query(look));
  expect(inside).toEqual([{ lab: nobody, isolation: 'read committed' }]);
  expect(await single[sqlDoor].query(look)).toMatchObject([{ lab: '' }]);
  await single.close();
});

test('runs a transaction again after a deadlock, so that both sides commit', async () => {
  const [a, b] = [await seedLaboratory(there.store, 'left'), await seedLaboratory(there.store, 'right')];
  let arrived = 0;
  let meet = () => {};
  const bothHoldOne = new Promise<void>((resolve) => {
    meet = resolve;
  });
  let runCount = 0;
  const cross = (first: string, second: string) =>
    there.store[sqlDoor].transaction(async (sql) => {
      runCount += 1;
      const lock = 'update feed_head set last_sequence = last_sequence + 1 where laboratory_id = $1';
      await sql.query(lock, [first]);
      arrived += 1;
      if (arrived >= 2) meet();
      await bothHoldOne;
      await sql.query(lock, [second]);
    });
  await Promise.all([cross(a.laboratoryId, b.laboratoryId), cross(b.laboratoryId, a.laboratoryId)]);
  expect(runCount).toBe(3);
  const { rows } = await there.client.query(
    'select last_sequence::integer as at from feed_head where laboratory_id = any($1)',
    [[a.laboratoryId, b.laboratoryId]],
  );
  expect(rows).toEqual([{ at: 2 }, { at: 2 }]);
});

test('gives up after the fourth conflict', async () => {
  let runCount = 0;
  const conflict = there.store[sqlDoor].transaction(async (sql) => {
    runCount += 1;
    await sql.query(`do $$ begin raise exception 'made up' using errcode = 'serialization_failure'; end $$`);
  });
  await expect(conflict).rejects.toThrow('made up');
  expect(runCount).toBe(4);
});

test('goes on after the server cut its connections, and tells such a loss from a mistake', async () => {
  const faults: Error[] = [];
  const store = openStore({
    connectionString: there.connectionString,
    applicationName: 'cut',
    onConnectionFault: (error) => faults.push(error),
  });
  const cut = store[sqlDoor].query(`select pg_terminate_backend(pg_backend_pid())`);
  await cut.then(
    () => expect.unreachable('the connection was not cut'),
    (error) => expect(isStoreUnavailable(error)).toBe(true),
  );
  expect(await store[sqlDoor].query('select 1 as one')).toEqual([{ one: 1 }]);
  const mistake = await store[sqlDoor].query('select nonsense').catch((error: unknown) => error);
  expect(isStoreUnavailable(mistake)).toBe(false);
  await store.close();
});

test('is ready with its migrations, and says what is missing otherwise', async () => {
  expect(await checkReadiness(there.store)).toEqual({
    databaseAnswers: true,
    migrationsCurrent: true,
    detail: 'answers',
  });
  const away = openStore({ connectionString: 'postgresql://x@/x?host=/nowhere', applicationName: 'away' });
  expect(await checkReadiness(away)).toMatchObject({ databaseAnswers: false, migrationsCurrent: false });
  await away.close();
  const bare = await createTestDatabase();
  const store = openStore({ connectionString: bare.connectionString, applicationName: 'bare' });
  await store[sqlDoor].query('delete from schema_migration where number = 1');
  expect(await checkReadiness(store)).toMatchObject({ databaseAnswers: true, migrationsCurrent: false });
  await store[sqlDoor].query('drop schema spinassay cascade');
  expect(await checkReadiness(store)).toMatchObject({ databaseAnswers: true, migrationsCurrent: false });
  await store.close();
  await bare.drop();
});
