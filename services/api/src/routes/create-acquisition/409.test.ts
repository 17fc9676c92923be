import type { Acquisition } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem, pointersOf } from '../../../test-support/expect-problem.ts';
import { put, signalOf } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('refuses the same signal with other conditions and names every difference', async () => {
  const signal = signalOf(100);
  const held = await put<Acquisition>(api, '/v1/acquisitions', { signal, conditions: { pH: 6, solvent: 'D2O' } });
  const json = { signal, conditions: { pH: 7, solvent: 'D2O', flipAngleDegrees: 30 } };
  const problem = await expectProblem(
    await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json }),
    'conditions-differ',
  );
  expect(pointersOf(problem)).toEqual(['#/conditions/flipAngleDegrees', '#/conditions/pH']);
  expect(problem.errors?.map((fault) => fault.detail)).toEqual(['held: undeclared; sent: 30', 'held: 6; sent: 7']);
  expect(problem['acquisitionId']).toBe(held.id);
});

test('leaves what is held as it was', async () => {
  const signal = signalOf(133);
  const held = await put<Acquisition>(api, '/v1/acquisitions', { signal, conditions: { pH: 6 } });
  await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json: { signal, conditions: { pH: 7 } } });
  const response = await api.send('GET', `/v1/acquisitions/${held.id}`, { role: 'lims' });
  expect(await response.json()).toEqual(held);
});
