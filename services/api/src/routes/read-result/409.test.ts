import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem } from '../../../test-support/expect-problem.ts';
import { finishFit } from '../../../test-support/finish-fit.ts';
import { askForFit } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('has no result of a fit that waits or has failed, and says which', async () => {
  const { id } = await askForFit(api);
  const ask = (): Promise<Response> => api.send('GET', `/v1/fits/${id}/result`, { role: 'lims' });
  expect((await expectProblem(await ask(), 'fit-not-completed'))['fitStatus']).toBe('queued');
  await finishFit(api, 'failed');
  expect((await expectProblem(await ask(), 'fit-not-completed'))['fitStatus']).toBe('failed');
});
