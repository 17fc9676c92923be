import { expect, test } from 'vitest';
import { askForInventedFit, readFit } from './invented-sample.ts';
import { makeHome, startStack } from './running-stack.ts';

const requestCount = 300;

test('answers every health request while every thread is busy', async () => {
  const { home, remove } = await makeHome();
  const stack = await startStack(home, { SPINASSAY_FIT_CONCURRENCY: '2' });
  try {
    const ids: string[] = [];
    for (let seed = 31; seed < 43; seed += 1) ids.push(await askForInventedFit(stack, seed));
    const runningCount = async () => {
      const fits = await Promise.all(ids.map((id) => readFit(stack, id)));
      return fits.filter(({ status }) => status === 'running').length;
    };
    await expect.poll(runningCount, { timeout: 60_000 }).toBe(2);
    let answeredCount = 0;
    for (let index = 0; index < requestCount; index += 1) {
      if ((await fetch(`${stack.access.baseUrl}/healthz`)).status === 200) answeredCount += 1;
    }
    expect(answeredCount).toBe(requestCount);
    // They were busy all the while: a free thread takes up the next of twelve fits, and there is one.
    await expect.poll(runningCount).toBe(2);
  } finally {
    await stack.stop();
    await remove();
  }
});
