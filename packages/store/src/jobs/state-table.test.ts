import { expect, test } from 'vitest';
import { digestOf, seedLaboratory, storeForTests } from '../../test-support/index.ts';
import type { JobState } from '../index.ts';

const there = storeForTests();
const states: JobState[] = ['queued', 'running', 'completed', 'failed', 'cancelled'];

// The state table of the house style, section 8: queued <-> running, running -> completed | failed, queued | running -> cancelled.
const allowed = [
  'queued running',
  'running queued',
  'running completed',
  'running failed',
  'queued cancelled',
  'running cancelled',
];

/** Columns that the checks of the table ask for in each state. */
const filling: Record<JobState, string> = {
  queued: 'worker_id = null, lease_until = null',
  running: 'worker_id = $2, lease_until = now(), attempt = attempt + 1',
  completed: 'worker_id = null, lease_until = null, finished_at = now()',
  failed: `worker_id = null, lease_until = null, finished_at = now(), problem = '{}'`,
  cancelled: 'worker_id = null, lease_until = null, finished_at = now()',
};
const ways: Record<JobState, JobState[]> = {
  queued: [],
  running: ['running'],
  completed: ['running', 'completed'],
  failed: ['running', 'failed'],
  cancelled: ['cancelled'],
};

async function move(id: string, to: JobState, workerId: string): Promise<void> {
  // Every text names both parameters, so that one list of values fits all.
  await there.client.query(`update job set state = '${to}', ${filling[to]} where id = $1 and $2::uuid is not null`, [
    id,
    workerId,
  ]);
}

test('allows exactly the six changes of state, and every other is refused', async () => {
  const laboratory = await seedLaboratory(there.store, 'states');
  const { rows } = await there.client.query(
    `insert into worker (label, wanted_concurrency) values ('test', 1) returning id`,
  );
  const workerId = rows[0].id;
  const passed: string[] = [];
  for (const from of states) {
    for (const to of states.filter((state) => state !== from)) {
      const { id } = await laboratory.askForFit(`${from} ${to}`);
      for (const step of ways[from]) await move(id, step, workerId);
      await move(id, to, workerId).then(
        () => passed.push(`${from} ${to}`),
        (error: Error) => expect(error.message).toMatch(/cannot go from|never changes again/),
      );
    }
  }
  expect(passed.sort()).toEqual([...allowed].sort());
});

test('refuses a job that starts running, an attempt that is set back, and any change of a final job', async () => {
  const laboratory = await seedLaboratory(there.store, 'starts');
  const { client } = there;
  await expect(
    client.query(
      `insert into job (laboratory_id, kind, state, natural_key, max_attempts) values ($1, 'fit', 'completed', $2, 1)`,
      [laboratory.laboratoryId, digestOf('x')],
    ),
  ).rejects.toThrow(/starts queued/);
  const { id } = await laboratory.askForFit('set back');
  await expect(client.query('update job set attempt = 7 where id = $1', [id])).rejects.toThrow(/attempt of a job/);
  await client.query(`update job set state = 'cancelled', finished_at = now() where id = $1`, [id]);
  await expect(client.query(`update job set stage = 'x' where id = $1`, [id])).rejects.toThrow(/never changes again/);
});

test('refuses every change of what is a fact', async () => {
  await seedLaboratory(there.store, 'facts');
  for (const table of ['acquisition', 'acquisition_conditions', 'document', 'blob', 'blob_chunk', 'audit']) {
    await expect(there.client.query(`update ${table} set laboratory_id = laboratory_id`)).rejects.toThrow(
      /never change/,
    );
  }
});
