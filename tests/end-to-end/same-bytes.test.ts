// Determinism (design, section 5): recomputing with the same inputs, seed and numericsId gives the same bytes on any worker and thread count.
import { createHash } from 'node:crypto';
import { expect, test } from 'vitest';
import { askForInventedFit, untilCompleted } from './invented-sample.ts';
import { makeHome, startStack } from './running-stack.ts';

const seeds = [1, 2, 3];

async function resultsWith(concurrency: string): Promise<{ texts: string[]; digests: (string | undefined)[] }> {
  const { home, remove } = await makeHome();
  const stack = await startStack(home, { SPINASSAY_FIT_CONCURRENCY: concurrency });
  try {
    const ids: string[] = [];
    for (const seed of seeds) ids.push(await askForInventedFit(stack, seed));
    const fits = await Promise.all(ids.map((id) => untilCompleted(stack, id)));
    const texts = await Promise.all(ids.map((id) => stack.read('lims', `/v1/fits/${id}/result`)));
    return { texts, digests: fits.map(({ resultSha256 }) => resultSha256) };
  } finally {
    await stack.stop();
    await remove();
  }
}

test('gives the same result bytes in another home folder and with another number of threads', async () => {
  const alone = await resultsWith('1');
  const together = await resultsWith('2');
  expect(together.texts).toEqual(alone.texts);
  // Three samples, three results: bytes that are equal because they say nothing would be equal here too.
  expect(new Set(alone.texts).size).toBe(seeds.length);
  // SHA-256 by Node's own library over the bytes as they came.
  const digestOf = (text: string) => createHash('sha256').update(text).digest('hex');
  expect(alone.texts.map(digestOf)).toEqual(alone.digests);
});
