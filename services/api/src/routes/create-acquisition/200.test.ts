import type { Acquisition } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { signalOf } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('answers the same signal with the same conditions with what is stored', async () => {
  const json = { signal: signalOf(100), conditions: { solvent: 'D2O', pH: 6 } };
  const first = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json });
  const reordered = { conditions: { pH: 6, solvent: 'D2O' }, signal: signalOf(100) };
  const second = await api.send('POST', '/v1/acquisitions', { role: 'analyst', json: reordered });
  expect([first.status, second.status]).toEqual([201, 200]);
  expect(second.headers.get('location')).toBe(first.headers.get('location'));
  expect(await second.json()).toEqual(await first.json());
});

test('stores a signal once when ten senders are in doubt at the same time', async () => {
  const json = { signal: signalOf(111) };
  const sends = Array.from({ length: 10 }, () => api.send('POST', '/v1/acquisitions', { role: 'pipeline', json }));
  const responses = await Promise.all(sends);
  const ids = await Promise.all(responses.map(async (response) => ((await response.json()) as Acquisition).id));
  expect(new Set(ids).size).toBe(1);
  expect(responses.map((response) => response.status).sort()).toEqual([...Array(9).fill(200), 201]);
});

test('keeps the same signal apart in two laboratories', async () => {
  const json = { signal: signalOf(122) };
  const own = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json });
  const foreign = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json, laboratory: 'foreign' });
  expect([own.status, foreign.status]).toEqual([201, 201]);
});
