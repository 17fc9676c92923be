import { connect } from 'node:net';
import { issueAccessKey } from '@spinassay/store';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem } from '../../../test-support/expect-problem.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

const headers = { 'content-type': 'application/json' };

test.each([
  ['an empty body', ''],
  ['a body cut short', '{"signal": {'],
  ['two values', '{} {}'],
  ['bytes that are not UTF-8', new Uint8Array([0x22, 0xff, 0x22])],
])('refuses %s as not JSON', async (_name, body) => {
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', body, headers });
  await expectProblem(response, 'malformed-json');
});

test('refuses a query parameter that it does not know', async () => {
  const response = await api.send('POST', '/v1/acquisitions?dryRun=1', { role: 'pipeline', body: '{}', headers });
  const problem = await expectProblem(response, 'invalid-query');
  expect(problem.errors).toEqual([{ parameter: 'dryRun', detail: 'this name is not known here' }]);
});

test('takes a client that leaves while it sends for no fault of ours', async () => {
  const { laboratoryId, store } = api;
  const { token } = await issueAccessKey(store, { laboratoryId, roles: ['pipeline'], label: 'leaves early' });
  const { hostname, port } = new URL(api.baseUrl);
  const refusalCount = (): number => api.logText().split('request-refused').length;
  const before = refusalCount();
  const lines = [
    'POST /v1/acquisitions HTTP/1.1',
    `Host: ${hostname}`,
    `Authorization: Bearer ${token}`,
    'Content-Type: application/json',
    'Content-Length: 100',
  ];
  const socket = connect(Number(port), hostname);
  socket.write(`${lines.join('\r\n')}\r\n\r\n{"signal"`, () => socket.end());
  await new Promise((resolve) => socket.on('close', resolve).resume());
  await vi.waitUntil(() => refusalCount() > before);
  expect((await api.send('GET', '/healthz')).status).toBe(200);
  expect(api.logText()).not.toContain('internal-fault');
});
