import { type Operation, operations, roles } from '@spinassay/contract';
import { issueAccessKey, revokeAccessKey } from '@spinassay/store';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../test-support/api-fixture.ts';
import { expectProblem } from '../../test-support/expect-problem.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

const secured = Object.values(operations).filter((operation: Operation) => operation.roles !== 'open');
const pathOf = (operation: Operation): string => operation.path.replace('{id}', 'x');

// The challenge: RFC 6750 section 3 (no error code when no key was given; invalid_token else).
test.each(secured.map((operation) => [operation.operationId, operation] as const))(
  'asks for a key before anything else in %s',
  async (_operationId, operation) => {
    const missing = await api.send(operation.method, pathOf(operation));
    await expectProblem(missing, 'key-missing');
    expect(missing.headers.get('www-authenticate')).toBe('Bearer realm="spinassay"');
  },
);

test.each(secured.map((operation) => [operation.operationId, operation] as const))(
  'lets nobody into %s but the roles that the contract names',
  async (_operationId, operation: Operation) => {
    for (const role of roles) {
      const response = await api.send(operation.method, pathOf(operation), { role });
      const isAllowed = operation.roles !== 'open' && operation.roles.includes(role);
      expect([role, response.status === 403]).toEqual([role, !isAllowed]);
      if (!isAllowed) await expectProblem(response, 'role-not-sufficient');
    }
  },
);

const secret = 'A'.repeat(43);
test.each([
  ['a key that was never issued', `Bearer sa_0190c3a27d55_${secret}`],
  ['a key of another form', 'Bearer hunter2'],
  ['a key with quotes that SQL would mind', `Bearer sa_'--_${secret}`],
])('does not know %s', async (_name, authorization) => {
  const response = await api.send('GET', '/v1/results', { headers: { authorization } });
  await expectProblem(response, 'key-unknown');
  expect(response.headers.get('www-authenticate')).toContain('error="invalid_token"');
});

test.each([['Basic c2E6c2E='], ['Bearer'], ['Bearer ']])('takes "%s" as no key', async (authorization) => {
  await expectProblem(await api.send('GET', '/v1/results', { headers: { authorization } }), 'key-missing');
});

test('takes the scheme in any case, and knows a withdrawn or expired key no longer', async () => {
  const { laboratoryId, store } = api;
  const key = await issueAccessKey(store, { laboratoryId, roles: ['lims'], label: 'to be withdrawn' });
  const ask = (token: string): Promise<Response> =>
    api.send('GET', '/v1/results', { headers: { authorization: `bEaReR ${token}` } });
  expect((await ask(key.token)).status).toBe(200);
  await expectProblem(await ask(`${key.token.slice(0, -1)}${key.token.endsWith('A') ? 'B' : 'A'}`), 'key-unknown');
  await store.withLaboratory(laboratoryId, (transaction) => revokeAccessKey(transaction, key.keyId));
  await expectProblem(await ask(key.token), 'key-unknown');
  const expiresAt = '2001-01-01T00:00:00.000Z';
  const expired = await issueAccessKey(store, { laboratoryId, roles: ['lims'], label: 'expired', expiresAt });
  await expectProblem(await ask(expired.token), 'key-unknown');
});

test('writes no key into the log', async () => {
  const { laboratoryId, store } = api;
  const { token } = await issueAccessKey(store, { laboratoryId, roles: ['lims'], label: 'secret' });
  await api.send('GET', '/v1/fits/none', { headers: { authorization: `Bearer ${token}` } });
  expect(api.logText()).toContain('request-refused');
  expect(api.logText()).not.toContain(token.slice(-20));
});
