import type { Acquisition } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { put, signalOf } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('reads back what was answered when it was stored, with every role', async () => {
  const stored = await put<Acquisition>(api, '/v1/acquisitions', { signal: signalOf(100), conditions: { pH: 6 } });
  for (const role of ['pipeline', 'analyst', 'lims', 'method-owner', 'admin', 'auditor'] as const) {
    const response = await api.send('GET', `/v1/acquisitions/${stored.id}`, { role });
    expect([response.status, await response.json()]).toEqual([200, stored]);
  }
});
