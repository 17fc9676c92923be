import { afterAll, beforeAll, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem } from '../../../test-support/expect-problem.ts';
import { askForFit } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('knows nothing of other laboratories or of what is no id, also when asked to wait', async () => {
  const { id } = await askForFit(api);
  const headers = { prefer: 'wait=20' };
  const foreign = await api.send('GET', `/v1/fits/${id}`, { role: 'admin', laboratory: 'foreign', headers });
  await expectProblem(foreign, 'unknown-resource');
  await expectProblem(await api.send('GET', '/v1/fits/none', { role: 'admin', headers }), 'unknown-resource');
  await expectProblem(await api.send('GET', '/v1/fits/none/result', { role: 'admin' }), 'unknown-resource');
});
