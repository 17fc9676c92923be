import type { Acquisition } from '@spinassay/contract';
import { afterAll, beforeAll, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem } from '../../../test-support/expect-problem.ts';
import { put, signalOf } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test.each([
  ['an id that nobody holds', '0190c3a2-7d55-7c11-9c5e-3f0d6b2f6a01'],
  ['a text that is no id', 'tank-4'],
  ['a path that tries to climb', '..%2f..%2fetc'],
])('knows nothing of %s', async (_name, id) => {
  const response = await api.send('GET', `/v1/acquisitions/${id}`, { role: 'lims' });
  await expectProblem(response, 'unknown-resource');
});

test('knows nothing of another laboratory', async () => {
  const stored = await put<Acquisition>(api, '/v1/acquisitions', { signal: signalOf(100) });
  const path = `/v1/acquisitions/${stored.id}`;
  await expectProblem(await api.send('GET', path, { role: 'admin', laboratory: 'foreign' }), 'unknown-resource');
  await expectProblem(
    await api.send('GET', `${path}/original`, { role: 'admin', laboratory: 'foreign' }),
    'unknown-resource',
  );
});
