import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem } from '../../../test-support/expect-problem.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test.each(['0', '-1', '1e3', '0x10', '1.5', '', 'latest', '9999999999'])(
  'refuses the version "%s"',
  async (version) => {
    const response = await api.send('GET', `/v1/compounds/acetate?version=${version}`, { role: 'lims' });
    const problem = await expectProblem(response, 'invalid-query');
    expect(problem.errors?.[0]?.parameter).toBe('version');
  },
);

test('refuses a version given twice, and names parameters it does not know', async () => {
  const response = await api.send('GET', '/v1/compounds/acetate?version=1&version=2&verison=1', { role: 'lims' });
  const problem = await expectProblem(response, 'invalid-query');
  expect(problem.errors?.map((fault) => fault.parameter).sort()).toEqual(['verison', 'version']);
});
