import { expect, test } from 'vitest';
import { createClaimLoop } from './claim-loop.ts';

/** Work that ends when the test says so. */
function madeUpWork(jobs: string[]) {
  const ends = new Map<string, () => void>();
  const begun: string[] = [];
  const troubles: unknown[] = [];
  const loop = createClaimLoop<string>({
    concurrency: 2,
    claim: async () => jobs.shift(),
    perform: (job) => {
      begun.push(job);
      return new Promise((resolve) => ends.set(job, resolve));
    },
    onTrouble: (error) => troubles.push(error),
  });
  return { loop, begun, troubles, end: (job: string) => ends.get(job)?.() };
}

test('takes up as many jobs as it may, and the next one as soon as a place is free', async () => {
  const { loop, begun, end } = madeUpWork(['a', 'b', 'c']);
  await loop.wake();
  expect([begun, loop.activeCount()]).toEqual([['a', 'b'], 2]);
  end('a');
  await expect.poll(() => begun).toEqual(['a', 'b', 'c']);
});

test('takes up more at once when it may do more, and no more when it may do less', async () => {
  const { loop, begun, end } = madeUpWork(['a', 'b', 'c', 'd']);
  await loop.wake();
  loop.setConcurrency(3);
  await expect.poll(() => begun).toEqual(['a', 'b', 'c']);
  loop.setConcurrency(1);
  for (const job of ['a', 'b']) end(job);
  await expect.poll(() => loop.activeCount()).toBe(1);
  await loop.wake();
  expect(begun).toEqual(['a', 'b', 'c']);
});

test('does not sleep through work that comes while a claim finds nothing', async () => {
  const jobs: string[] = [];
  const begun: string[] = [];
  let release: () => void = () => {};
  const firstClaim = new Promise<void>((resolve) => {
    release = resolve;
  });
  let claimCount = 0;
  const loop = createClaimLoop<string>({
    concurrency: 1,
    claim: async () => {
      claimCount += 1;
      if (claimCount > 1) return jobs.shift();
      await firstClaim;
      return undefined; // What the database said before the job was committed.
    },
    perform: async (job) => void begun.push(job),
    onTrouble: () => {},
  });
  const first = loop.wake();
  jobs.push('late');
  const second = loop.wake();
  release();
  await Promise.all([first, second]);
  await expect.poll(() => begun).toEqual(['late']);
});

test('claims nothing more once it is stopped, and waits for what runs', async () => {
  const jobs = ['a'];
  const { loop, begun, end } = madeUpWork(jobs);
  await loop.wake();
  jobs.push('b');
  let hasStopped = false;
  const stopped = loop.stop().then(() => {
    hasStopped = true;
  });
  await loop.wake();
  expect([hasStopped, begun]).toEqual([false, ['a']]);
  end('a');
  await stopped;
  expect(begun).toEqual(['a']);
});

test('tells of a claim that failed and claims again at the next wake', async () => {
  const answers = [Promise.reject(new Error('away')), Promise.resolve('a'), Promise.resolve(undefined)];
  answers[0]?.catch(() => {}); // Heard by the loop, later.
  const troubles: unknown[] = [];
  const begun: string[] = [];
  const loop = createClaimLoop<string>({
    concurrency: 1,
    claim: () => answers.shift() ?? Promise.resolve(undefined),
    perform: async (job) => void begun.push(job),
    onTrouble: (error) => troubles.push(error),
  });
  await loop.wake();
  expect([troubles, begun]).toEqual([[new Error('away')], []]);
  await loop.wake();
  expect(begun).toEqual(['a']);
});
