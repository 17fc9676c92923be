import { problemCatalogue } from '@spinassay/problems';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('serves a page for every kind of problem in the catalogue', async () => {
  for (const { slug, title } of Object.values(problemCatalogue)) {
    const response = await api.send('GET', `/problems/${slug}`);
    expect([response.status, response.headers.get('content-type')]).toEqual([200, 'text/html; charset=utf-8']);
    expect(await response.text()).toContain(`<h1>${title}</h1>`);
  }
});
