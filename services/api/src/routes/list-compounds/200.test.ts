import { documentListSchema } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { put, singletCompound } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('lists the latest version of each, without bodies, in order of id', async () => {
  for (const [id, shiftPpm] of [
    ['tsp', 0],
    ['acetate', 1.9],
    ['acetate', 1.91],
  ] as const) {
    await put(api, '/v1/compounds', singletCompound(id, shiftPpm));
  }
  const response = await api.send('GET', '/v1/compounds', { role: 'auditor' });
  const { items } = documentListSchema.parse(await response.json());
  expect(items.map(({ id, version, name }) => [id, version, name])).toEqual([
    ['acetate', 2, 'acetate'],
    ['tsp', 1, 'tsp'],
  ]);
});

test('lists nothing of another laboratory', async () => {
  const response = await api.send('GET', '/v1/compounds', { role: 'auditor', laboratory: 'foreign' });
  expect(await response.json()).toEqual({ items: [] });
});
