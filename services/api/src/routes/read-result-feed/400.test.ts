import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem } from '../../../test-support/expect-problem.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test.each([
  ['a cursor of its own making', 'after=17', 'after'],
  ['a cursor with something behind it', 'after=ZmVlZDox%20', 'after'],
  ['a page of nothing', 'limit=0', 'limit'],
  ['a page without end', 'limit=501', 'limit'],
])('refuses %s', async (_name, query, parameter) => {
  const problem = await expectProblem(await api.send('GET', `/v1/results?${query}`, { role: 'lims' }), 'invalid-query');
  expect(problem.errors?.map((fault) => fault.parameter)).toEqual([parameter]);
});
