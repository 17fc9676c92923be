import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { waitUntil } from './wait-until.ts';

beforeEach(() => {
  vi.useFakeTimers();
});
afterEach(() => {
  vi.useRealTimers();
});

/** A value that others change, and a way to tell of it. */
function source(first: string) {
  const watchers = new Set<() => void>();
  let value = first;
  let queryCount = 0;
  return {
    set: (next: string, isTold = true): void => {
      value = next;
      if (isTold) for (const watcher of watchers) watcher();
    },
    watcherCount: () => watchers.size,
    queryCount: () => queryCount,
    plan: (signal = new AbortController().signal) => ({
      seconds: 30,
      query: async () => {
        queryCount += 1;
        return value;
      },
      isDone: (current: string) => current === 'completed',
      watch: (onNotice: () => void) => {
        watchers.add(onNotice);
        return () => watchers.delete(onNotice);
      },
      signal,
    }),
  };
}

test('answers at once when it is done already', async () => {
  const fit = source('completed');
  expect(await waitUntil(fit.plan())).toBe('completed');
  expect([fit.queryCount(), fit.watcherCount()]).toEqual([1, 0]);
});

test('wakes on a notice without waiting for its poll', async () => {
  const fit = source('queued');
  const waited = waitUntil(fit.plan());
  await vi.advanceTimersByTimeAsync(10);
  fit.set('completed');
  await vi.advanceTimersByTimeAsync(0);
  expect(await waited).toBe('completed');
  expect([fit.queryCount(), fit.watcherCount(), vi.getTimerCount()]).toEqual([2, 0, 0]);
});

test('misses no change that falls between its query and its wait', async () => {
  const fit = source('queued');
  const plan = fit.plan();
  const query = async (): Promise<string> => {
    const value = await plan.query();
    if (value === 'queued') fit.set('completed');
    return value;
  };
  expect(await waitUntil({ ...plan, query })).toBe('completed');
  expect(fit.queryCount()).toBe(2);
});

test('finds a change whose notice was lost by its poll', async () => {
  const fit = source('queued');
  const waited = waitUntil(fit.plan());
  await vi.advanceTimersByTimeAsync(10);
  fit.set('completed', false);
  await vi.advanceTimersByTimeAsync(2_000);
  expect(await waited).toBe('completed');
});

test('answers the last value when the time is up', async () => {
  const fit = source('running');
  const waited = waitUntil({ ...fit.plan(), seconds: 3 });
  await vi.advanceTimersByTimeAsync(3_000);
  expect(await waited).toBe('running');
  expect([fit.watcherCount(), vi.getTimerCount()]).toEqual([0, 0]);
});

test('answers the last value as soon as the service drains', async () => {
  const fit = source('running');
  const draining = new AbortController();
  const waited = waitUntil(fit.plan(draining.signal));
  await vi.advanceTimersByTimeAsync(10);
  draining.abort();
  await vi.advanceTimersByTimeAsync(0);
  expect(await waited).toBe('running');
  expect([fit.watcherCount(), vi.getTimerCount()]).toEqual([0, 0]);
});

test('lets go of its watcher when the query fails', async () => {
  const fit = source('running');
  const query = (): Promise<string> => Promise.reject(new Error('database away'));
  await expect(waitUntil({ ...fit.plan(), query })).rejects.toThrow('database away');
  expect(fit.watcherCount()).toBe(0);
});
