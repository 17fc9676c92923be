import { preparationSchema } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { put, singletCompound, tspPreparation } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('stores a tube, and a correction as its next version', async () => {
  await put(api, '/v1/compounds', singletCompound('tsp', 0));
  const first = await api.send('POST', '/v1/preparations', { role: 'analyst', json: tspPreparation });
  expect([first.status, preparationSchema.parse(await first.json()).version]).toEqual([201, 1]);
  const corrected = { ...tspPreparation, body: { ...tspPreparation.body, label: 'tube 1' } };
  const second = await api.send('POST', '/v1/preparations', { role: 'pipeline', json: corrected });
  const preparation = preparationSchema.parse(await second.json());
  expect([second.status, preparation.version, preparation.body.label]).toEqual([201, 2, 'tube 1']);
});
