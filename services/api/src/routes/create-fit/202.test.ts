import { type Acquisition, type Fit, fitSchema } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { put, signalOf, stockLaboratory } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('queues a fit in the latest versions, rings, and says where it is', async () => {
  const post = await stockLaboratory(api);
  const response = await api.send('POST', '/v1/fits', { role: 'pipeline', json: post });
  const fit = fitSchema.parse(await response.json());
  expect([response.status, response.headers.get('location')]).toEqual([202, `/v1/fits/${fit.id}`]);
  expect(fit).toMatchObject({ status: 'queued', attempt: 0, methodVersion: 1, preparationVersion: 1, options: {} });
  expect(api.ringCount()).toBe(1);
});

test('takes the first 64 bits of the input digest as the seed', async () => {
  const acquisition = await put<Acquisition>(api, '/v1/acquisitions', { signal: signalOf(210) });
  const fit = await put<Fit>(api, '/v1/fits', { acquisitionId: acquisition.id, methodId: 'acetate-in-cider' });
  expect(BigInt(fit.seed).toString(16).padStart(16, '0')).toBe(fit.inputSha256.slice(0, 16));
});

test('gives the same contents the same input digest in another laboratory', async () => {
  const seeds: string[] = [];
  for (const laboratory of ['own', 'foreign'] as const) {
    const elsewhere = { ...api, send: ((m, p, ask) => api.send(m, p, { ...ask, laboratory })) as typeof api.send };
    const post = await stockLaboratory(elsewhere);
    const fit = await put<Fit>(elsewhere, '/v1/fits', { ...post, repeatReason: 'second look' });
    seeds.push(fit.inputSha256);
  }
  expect(seeds[0]).toBe(seeds[1]);
});

test('queues a repeat with its reason as another fit with the same seed', async () => {
  const post = await stockLaboratory(api);
  const first = await api.send('POST', '/v1/fits', { role: 'pipeline', json: post });
  const repeat = await api.send('POST', '/v1/fits', { role: 'pipeline', json: { ...post, repeatReason: 'audit' } });
  const [a, b] = [(await first.json()) as Fit, (await repeat.json()) as Fit];
  expect([repeat.status, a.id === b.id, a.seed === b.seed, b.repeatReason]).toEqual([202, false, true, 'audit']);
});
