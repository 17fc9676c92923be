import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem, pointersOf } from '../../../test-support/expect-problem.ts';
import { tspPreparation } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('points at a standard that is not in the catalogue', async () => {
  const response = await api.send('POST', '/v1/preparations', { role: 'pipeline', json: tspPreparation });
  expect(pointersOf(await expectProblem(response, 'unknown-reference'))).toEqual(['#/body/standard/compoundId']);
});

test('refuses an amount without an uncertainty, and one of zero', async () => {
  for (const standardUncertainty of [undefined, 0]) {
    const amountConcentration = { value: 0.5, unit: 'mmol/L', standardUncertainty };
    const json = { id: 'tank-4', body: { standard: { compoundId: 'tsp', amountConcentration } } };
    const response = await api.send('POST', '/v1/preparations', { role: 'pipeline', json });
    const pointer = '#/body/standard/amountConcentration/standardUncertainty';
    expect(pointersOf(await expectProblem(response, 'invalid-body'))).toEqual([pointer]);
  }
});
