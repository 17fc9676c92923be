import { afterAll, beforeAll, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem } from '../../../test-support/expect-problem.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('has no page for a kind that is not in the catalogue', async () => {
  await expectProblem(await api.send('GET', '/problems/teapot'), 'unknown-path');
});
