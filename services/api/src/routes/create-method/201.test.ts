import { type Method, methodSchema } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { acetateMethod, put, singletCompound } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('fixes the latest version of every compound, so that the method means the same for ever', async () => {
  await put(api, '/v1/compounds', singletCompound('acetate', 1.9));
  await put(api, '/v1/compounds', singletCompound('acetate', 1.91));
  await put(api, '/v1/compounds', singletCompound('tsp', 0));
  const response = await api.send('POST', '/v1/methods', { role: 'method-owner', json: acetateMethod });
  const method = methodSchema.parse(await response.json());
  expect([response.status, method.version]).toEqual([201, 1]);
  expect(method.body.panel[0]).toEqual({ compoundId: 'acetate', compoundVersion: 2, quantifierGroups: ['CH3'] });
  expect(method.body.reference).toEqual({ compoundId: 'tsp', compoundVersion: 1 });

  await put(api, '/v1/compounds', singletCompound('acetate', 1.92));
  const read = await api.send('GET', '/v1/methods/acetate-in-cider', { role: 'lims' });
  expect(await read.json()).toEqual(method);
});

test('makes the next version when a compound it names has moved on', async () => {
  const again = await api.send('POST', '/v1/methods', { role: 'method-owner', json: acetateMethod });
  const method = (await again.json()) as Method;
  expect([again.status, method.version, method.body.panel[0]?.compoundVersion]).toEqual([201, 2, 3]);
});

test('keeps a version that the author named', async () => {
  const panel = [{ compoundId: 'acetate', compoundVersion: 1 }];
  const json = { id: 'old-acetate', body: { ...acetateMethod.body, panel } };
  const method = await put<Method>(api, '/v1/methods', json);
  expect(method.body.panel[0]?.compoundVersion).toBe(1);
});
