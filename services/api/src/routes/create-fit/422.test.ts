import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem, pointersOf } from '../../../test-support/expect-problem.ts';
import { put, singletCompound, stockLaboratory } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

async function refusal(change: object, slug: 'unknown-reference' | 'invalid-body'): Promise<(string | undefined)[]> {
  const json = { ...(await stockLaboratory(api)), ...change };
  return pointersOf(await expectProblem(await api.send('POST', '/v1/fits', { role: 'pipeline', json }), slug));
}

test('points at everything that is not there', async () => {
  const absent = { acquisitionId: '0190c3a2-7d55-7c11-9c5e-3f0d6b2f6a01', methodId: 'ghost', preparationVersion: 9 };
  expect(await refusal(absent, 'unknown-reference')).toEqual(['#/acquisitionId', '#/methodId', '#/preparationId']);
});

test('refuses a preparation whose standard is not the one of the method', async () => {
  await put(api, '/v1/compounds', singletCompound('maleic-acid', 6.3));
  const amountConcentration = { value: 1, standardUncertainty: 0.01, unit: 'mmol/L' };
  const body = { standard: { compoundId: 'maleic-acid', amountConcentration } };
  await put(api, '/v1/preparations', { id: 'other-tube', body });
  expect(await refusal({ preparationId: 'other-tube' }, 'invalid-body')).toEqual(['#/preparationId']);
});

test('refuses options that do not exist instead of ignoring them', async () => {
  expect(await refusal({ options: { fast: true } }, 'invalid-body')).toEqual(['#/options/fast']);
});

test('takes nothing of another laboratory', async () => {
  const json = await stockLaboratory(api);
  const response = await api.send('POST', '/v1/fits', { role: 'pipeline', json, laboratory: 'foreign' });
  expect(pointersOf(await expectProblem(response, 'unknown-reference'))).toHaveLength(3);
});
