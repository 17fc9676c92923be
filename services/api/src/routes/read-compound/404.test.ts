import { afterAll, beforeAll, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem } from '../../../test-support/expect-problem.ts';
import { put, singletCompound } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('knows nothing of a version that was never made, of another laboratory, or of what is no name', async () => {
  await put(api, '/v1/compounds', singletCompound('acetate', 1.91));
  const ask = (path: string, laboratory: 'own' | 'foreign' = 'own'): Promise<Response> =>
    api.send('GET', path, { role: 'lims', laboratory });
  await expectProblem(await ask('/v1/compounds/acetate?version=2'), 'unknown-resource');
  await expectProblem(await ask('/v1/compounds/acetate', 'foreign'), 'unknown-resource');
  await expectProblem(await ask('/v1/methods/acetate'), 'unknown-resource');
  await expectProblem(await ask('/v1/compounds/%00'), 'unknown-resource');
});
