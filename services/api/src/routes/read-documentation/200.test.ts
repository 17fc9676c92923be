import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('serves pages whose every script and style comes from this service', async () => {
  const redirect = await api.send('GET', '/docs');
  expect([redirect.status, redirect.headers.get('location')]).toEqual([301, '/docs/']);
  const response = await api.send('GET', '/docs/');
  const html = await response.text();
  const links = [...html.matchAll(/(?:src|href)="([^"#][^"]*)"/g)].map(([, link]) => String(link));
  expect(links.length).toBeGreaterThan(3);
  for (const link of links) {
    const asset = await api.send('GET', new URL(link, `${api.baseUrl}/docs/`).pathname);
    expect([link.startsWith('./'), asset.status]).toEqual([true, 200]);
  }
});

test('reads this service and asks no outside validator', async () => {
  const script = await (await api.send('GET', '/docs/swagger-ui-init.js')).text();
  expect(script).toContain('"swaggerUrl": "/openapi.json"');
  expect(script).toContain('"validatorUrl": null');
});
