import { type Fit, fitSchema } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { finishFit } from '../../../test-support/finish-fit.ts';
import { askForFit, put } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

const waiting = { prefer: 'wait=20' };

test('wakes a waiting client as soon as the fit is final, long before its time is up', async () => {
  const { id } = await askForFit(api);
  const startedAt = performance.now();
  const waited = api.send('GET', `/v1/fits/${id}`, { role: 'pipeline', headers: waiting });
  await finishFit(api, 'completed');
  const response = await waited;
  const fit = fitSchema.parse(await response.json());
  expect([fit.status, response.headers.get('preference-applied')]).toEqual(['completed', 'wait=20']);
  expect(fit.resultSha256).toMatch(/^[0-9a-f]{64}$/);
  expect(performance.now() - startedAt).toBeLessThan(10_000);
});

test('reads a failed fit with 200 and the problem it stored, addressed to this reader', async () => {
  const { acquisitionId, methodId } = await askForFit(api);
  const { id } = await put<Fit>(api, '/v1/fits', { acquisitionId, methodId });
  await finishFit(api, 'failed');
  const response = await api.send('GET', `/v1/fits/${id}`, { role: 'lims' });
  const fit = fitSchema.parse(await response.json());
  expect([response.status, fit.status]).toEqual([200, 'failed']);
  expect(fit.problem).toMatchObject({
    type: `${api.baseUrl}/problems/analysis-not-possible`,
    status: 422,
    instance: `/v1/fits/${id}`,
  });
});

test('answers after the time when nothing happens, and at once when the service drains', async () => {
  const { acquisitionId, methodId } = await askForFit(api);
  const { id } = await put<Fit>(api, '/v1/fits', { acquisitionId, methodId, repeatReason: 'nobody takes it' });
  const short = await api.send('GET', `/v1/fits/${id}`, { role: 'lims', headers: { prefer: 'wait=1' } });
  expect(((await short.json()) as Fit).status).toBe('queued');
  const waited = api.send('GET', `/v1/fits/${id}`, { role: 'lims', headers: waiting });
  api.draining.abort();
  const startedAt = performance.now();
  expect(((await (await waited).json()) as Fit).status).toBe('queued');
  expect(performance.now() - startedAt).toBeLessThan(10_000);
});
