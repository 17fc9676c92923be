import { expect, test } from 'vitest';
import { bePatient } from './be-patient.ts';

const away = () => Object.assign(new Error('connect ECONNREFUSED'), { code: 'ECONNREFUSED' });

test('repeats the work while the database is away and gives its outcome when it is back', async () => {
  const troubles: unknown[] = [];
  let count = 0;
  const work = async () => {
    count += 1;
    if (count < 3) throw away();
    return 'done';
  };
  expect(await bePatient(work, { onTrouble: (error) => troubles.push(error) })).toBe('done');
  expect(troubles).toHaveLength(2);
});

test('does not repeat work that failed for another reason', async () => {
  let count = 0;
  const work = async () => {
    count += 1;
    throw new Error('a bug');
  };
  await expect(bePatient(work, { onTrouble: () => {} })).rejects.toThrow('a bug');
  expect(count).toBe(1);
});

test('gives up with the last failure when the trouble lasts', async () => {
  const work = () => Promise.reject(away());
  await expect(bePatient(work, { onTrouble: () => {}, secondsMax: 0 })).rejects.toThrow('ECONNREFUSED');
});
