import { type FeedPage, type Fit, feedPageSchema, sha256Hex } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { finishFit, recordedText } from '../../../test-support/finish-fit.ts';
import { askForFit, put } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

async function page(query: string, laboratory: 'own' | 'foreign' = 'own'): Promise<FeedPage> {
  const response = await api.send('GET', `/v1/results${query}`, { role: 'lims', laboratory });
  return feedPageSchema.parse(await response.json());
}

test('gives an empty page a cursor to go on from, and then every result once, in order', async () => {
  const start = await page('');
  expect([start.events, start.hasMore]).toEqual([[], false]);
  const first = await askForFit(api);
  const { acquisitionId, methodId, methodVersion } = first;
  const ids = [first.id];
  for (const repeatReason of ['second', 'third']) {
    ids.push((await put<Fit>(api, '/v1/fits', { acquisitionId, methodId, repeatReason })).id);
  }
  for (const _id of ids) await finishFit(api, 'completed');

  const two = await page(`?after=${start.nextCursor}&limit=2`);
  const rest = await page(`?after=${two.nextCursor}&limit=2`);
  expect([two.hasMore, rest.hasMore]).toEqual([true, false]);
  expect([...two.events, ...rest.events].map((event) => event.fitId).sort()).toEqual([...ids].sort());
  const resultSha256 = sha256Hex(recordedText);
  expect(two.events[0]).toMatchObject({ kind: 'result', acquisitionId, methodId, methodVersion, resultSha256 });
  const end = await page(`?after=${rest.nextCursor}`);
  expect([end.events, end.nextCursor]).toEqual([[], rest.nextCursor]);
});

test('shows nothing of another laboratory', async () => {
  expect((await page('', 'foreign')).events).toEqual([]);
});
