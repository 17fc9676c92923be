import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem, pointersOf } from '../../../test-support/expect-problem.ts';
import { acetateMethod, put, singletCompound } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

beforeAll(async () => {
  await put(api, '/v1/compounds', singletCompound('acetate', 1.91));
  await put(api, '/v1/compounds', singletCompound('tsp', 0));
});

async function faultsOf(body: object): Promise<(string | undefined)[]> {
  const json = { id: 'm', body: { ...acetateMethod.body, ...body } };
  const response = await api.send('POST', '/v1/methods', { role: 'method-owner', json });
  return pointersOf(await expectProblem(response, 'unknown-reference'));
}

test('points at every compound that is not there', async () => {
  const panel = [{ compoundId: 'acetate' }, { compoundId: 'ghost' }, { compoundId: 'acetone' }];
  const pointers = await faultsOf({ panel, reference: { compoundId: 'dss' }, standard: { compoundId: 'acetate' } });
  expect(pointers).toEqual(['#/body/panel/1/compoundId', '#/body/panel/2/compoundId', '#/body/reference/compoundId']);
});

test('points at a version that is not there', async () => {
  expect(await faultsOf({ panel: [{ compoundId: 'acetate', compoundVersion: 7 }] })).toEqual([
    '#/body/panel/0/compoundId',
  ]);
});

test('points at a quantifier group that the compound does not have', async () => {
  const panel = [{ compoundId: 'acetate', quantifierGroups: ['CH3', 'CH2'] }];
  expect(await faultsOf({ panel })).toEqual(['#/body/panel/0/quantifierGroups/1']);
});

test('refuses two versions of one compound in one tube', async () => {
  await put(api, '/v1/compounds', singletCompound('tsp', 0.001));
  const panel = [{ compoundId: 'tsp', compoundVersion: 1 }];
  const reference = { compoundId: 'tsp', compoundVersion: 2 };
  expect(await faultsOf({ panel, reference })).toEqual(['#/body/reference/compoundVersion']);
});
