import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem, pointersOf } from '../../../test-support/expect-problem.ts';
import { singletCompound } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('lists every fault at once and stores nothing', async () => {
  const json = singletCompound('acetate', 1.91);
  Object.assign(json.body, { molarMassGramsPerMole: -60, colour: 'none', sources: [] });
  const response = await api.send('POST', '/v1/compounds', {
    role: 'method-owner',
    json: { ...json, id: 'Acetic Acid' },
  });
  const problem = await expectProblem(response, 'invalid-body');
  const pointers = ['#/body/colour', '#/body/molarMassGramsPerMole', '#/body/sources', '#/id'];
  expect(pointersOf(problem).sort()).toEqual(pointers);
  const list = await api.send('GET', '/v1/compounds', { role: 'lims' });
  expect(await list.json()).toEqual({ items: [] });
});

test('never makes an answer larger than the body that caused it', async () => {
  const members = Object.fromEntries(Array.from({ length: 5_000 }, (_, index) => [`m${index}`, 1]));
  const response = await api.send('POST', '/v1/compounds', { role: 'method-owner', json: members });
  const problem = await expectProblem(response, 'invalid-body');
  expect(problem.errors).toHaveLength(100);
});
