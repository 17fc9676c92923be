import { type Operation, operations } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../test-support/api-fixture.ts';
import { expectProblem } from '../test-support/expect-problem.ts';
import { serveWithoutDatabase } from '../test-support/serve-without-database.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('refuses a method that a path does not take and names those it takes (RFC 9110 section 15.5.6)', async () => {
  const paths = new Map<string, string[]>();
  for (const { path, method } of Object.values(operations) as Operation[]) {
    const taken = method === 'get' ? ['GET', 'HEAD'] : ['POST'];
    paths.set(path, [...(paths.get(path) ?? []), ...taken]);
  }
  for (const [path, taken] of paths) {
    const response = await api.send('DELETE', path.replace('{id}', 'x'), { role: 'admin' });
    await expectProblem(response, 'method-not-allowed');
    expect([path, response.headers.get('allow')?.split(', ').sort()]).toEqual([path, taken.sort()]);
  }
});

test.each(['/', '/v1', '/v1/fit', '/v2/fits', '/v1/fits/a/b/c', '/v1/fits/%zz', '/docs/package.json.bak'])(
  'has nothing at %s',
  async (path) => {
    await expectProblem(await api.send('GET', path, { role: 'admin' }), 'unknown-path');
  },
);

test('answers HEAD like GET without the body (RFC 9110 section 9.3.2)', async () => {
  const head = await api.send('HEAD', '/healthz');
  const get = await api.send('GET', '/healthz');
  expect([head.status, await head.text()]).toEqual([200, '']);
  expect(head.headers.get('content-length')).toBe(get.headers.get('content-length'));
});

test('does not name what it is built with', async () => {
  const response = await api.send('GET', '/healthz');
  expect([response.headers.get('x-powered-by'), response.headers.get('server')]).toEqual([null, null]);
});

test('answers 503 with a time to come back when the database is away, and keeps what it was asked out of the log', async () => {
  const away = await serveWithoutDatabase();
  try {
    const headers = { authorization: `Bearer sa_0190c3a27d55_${'A'.repeat(43)}` };
    const response = await fetch(`${away.baseUrl}/v1/results`, { headers });
    await expectProblem(response, 'service-unavailable');
    expect(response.headers.get('retry-after')).toBe('5');
    expect(away.logText()).toContain('request-failed');
    expect(away.logText()).not.toContain('AAAA');
  } finally {
    await away.close();
  }
});
