import type { Fit } from '@spinassay/contract';
import { countJobs } from '@spinassay/store';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { finishFit } from '../../../test-support/finish-fit.ts';
import { put, stockLaboratory, tspPreparation } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('answers the same question with the first fit and rings once', async () => {
  const post = await stockLaboratory(api);
  const sends = Array.from({ length: 8 }, () => api.send('POST', '/v1/fits', { role: 'pipeline', json: post }));
  const responses = await Promise.all(sends);
  const fits = await Promise.all(responses.map(async (response) => (await response.json()) as Fit));
  expect(new Set(fits.map((fit) => fit.id)).size).toBe(1);
  expect(responses.map((response) => response.status).sort()).toEqual([...Array(7).fill(200), 202]);
  expect(api.ringCount()).toBe(1);
});

test('takes named versions that are the latest as the same question', async () => {
  const post = await stockLaboratory(api);
  const named = { ...post, methodVersion: 1, preparationVersion: 1, options: {} };
  expect((await api.send('POST', '/v1/fits', { role: 'analyst', json: named })).status).toBe(200);
});

test('takes another version of the preparation as another question', async () => {
  const post = await stockLaboratory(api);
  await put(api, '/v1/preparations', { ...tspPreparation, body: { ...tspPreparation.body, label: 'corrected' } });
  expect((await api.send('POST', '/v1/fits', { role: 'analyst', json: post })).status).toBe(202);
  const first = await api.send('POST', '/v1/fits', { role: 'analyst', json: { ...post, preparationVersion: 1 } });
  expect(first.status).toBe(200);
});

test('answers a completed fit again, but lets a failed one be asked for anew', async () => {
  const post = { ...(await stockLaboratory(api)), repeatReason: 'for this test' };
  while ((await unfinishedCount()) > 0) await finishFit(api, 'completed');
  const first = await put<Fit>(api, '/v1/fits', post);
  await finishFit(api, 'failed');
  const second = await api.send('POST', '/v1/fits', { role: 'pipeline', json: post });
  const fit = (await second.json()) as Fit;
  expect([second.status, fit.id === first.id]).toEqual([202, false]);
  await finishFit(api, 'completed');
  const third = await api.send('POST', '/v1/fits', { role: 'pipeline', json: post });
  expect([third.status, ((await third.json()) as Fit).status]).toEqual([200, 'completed']);
});

async function unfinishedCount(): Promise<number> {
  return (await countJobs(api.store)).queued;
}
