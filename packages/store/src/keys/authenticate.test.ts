import { expect, test } from 'vitest';
import { storeForTests } from '../../test-support/index.ts';
import { authenticate, createLaboratory, issueAccessKey, listLaboratories, revokeAccessKey } from '../index.ts';

const there = storeForTests();

test('knows who holds a token, and keeps nothing that the token could be read from', async () => {
  const { id: laboratoryId } = await createLaboratory(there.store, { name: 'keys' });
  expect(await listLaboratories(there.store)).toContainEqual({ id: laboratoryId, name: 'keys' });
  const order = { laboratoryId, roles: ['pipeline', 'analyst'], label: 'night run' } as const;
  const { keyId, token } = await issueAccessKey(there.store, order);
  expect(token).toMatch(/^sa_[0-9a-z]{12}_[A-Za-z0-9_-]{43}$/);
  expect(await authenticate(there.store, token)).toEqual({ keyId, ...order });
  const { rows } = await there.client.query('select access_key::text as text from access_key where id = $1', [keyId]);
  expect(rows[0].text).not.toContain(token.slice(16));
});

test('does not know tokens that are malformed, changed, of another key, expired or revoked', async () => {
  const { id: laboratoryId } = await createLaboratory(there.store, { name: 'strangers' });
  const order = { laboratoryId, roles: ['admin'], label: 'x' } as const;
  const [first, second] = [await issueAccessKey(there.store, order), await issueAccessKey(there.store, order)];
  const expired = await issueAccessKey(there.store, { ...order, expiresAt: '2020-01-01T00:00:00Z' });
  const strangers = [
    '',
    'sa_',
    first.token.slice(0, -1),
    `${first.token}x`,
    `${first.token.slice(0, -1)}${first.token.endsWith('A') ? 'E' : 'A'}`,
    `${first.token.slice(0, 16)}${second.token.slice(16)}`,
    `sa_000000000000_${first.token.slice(16)}`,
    expired.token,
  ];
  for (const token of strangers) expect(await authenticate(there.store, token)).toBeUndefined();
  const revoke = () =>
    there.store.withLaboratory(laboratoryId, (transaction) => revokeAccessKey(transaction, first.keyId));
  expect(await revoke()).toBe(true);
  expect(await revoke()).toBe(false);
  expect(await authenticate(there.store, first.token)).toBeUndefined();
  expect(await authenticate(there.store, second.token)).toBeDefined();
});

test('withdraws no key of another laboratory', async () => {
  const [mine, other] = [
    await createLaboratory(there.store, { name: 'holds a key' }),
    await createLaboratory(there.store, { name: 'meddles' }),
  ];
  const { keyId, token } = await issueAccessKey(there.store, { laboratoryId: mine.id, roles: ['lims'], label: 'x' });
  expect(await there.store.withLaboratory(other.id, (transaction) => revokeAccessKey(transaction, keyId))).toBe(false);
  expect(await authenticate(there.store, token)).toBeDefined();
});
