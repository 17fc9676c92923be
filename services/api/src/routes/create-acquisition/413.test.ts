import { operations } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem } from '../../../test-support/expect-problem.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('refuses a body over the limit of the operation and names the limit', async () => {
  const { limitBytes } = operations.createAcquisition.request;
  const headers = { 'content-type': 'chemical/x-jcamp-dx' };
  const body = new Uint8Array(limitBytes + 1);
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', body, headers });
  const problem = await expectProblem(response, 'payload-too-large');
  expect(problem['limitBytes']).toBe(limitBytes);
});

test('checks the size for each operation apart: a fit takes far less', async () => {
  const headers = { 'content-type': 'application/json' };
  const body = new Uint8Array(operations.createFit.request.limitBytes + 1);
  await expectProblem(await api.send('POST', '/v1/fits', { role: 'pipeline', body, headers }), 'payload-too-large');
});
