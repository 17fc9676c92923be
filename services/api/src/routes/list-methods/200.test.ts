import { documentListSchema } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { stockLaboratory } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('lists the methods and nothing of other kinds', async () => {
  await stockLaboratory(api);
  const response = await api.send('GET', '/v1/methods', { role: 'analyst' });
  const { items } = documentListSchema.parse(await response.json());
  expect(items.map(({ id, version, name }) => [id, version, name])).toEqual([
    ['acetate-in-cider', 1, 'Acetate in cider'],
  ]);
});
