import { afterAll, beforeAll, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem } from '../../../test-support/expect-problem.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test.each([
  ['text', 'text/plain'],
  ['a spreadsheet', 'text/csv'],
  ['JSON in another charset', 'application/json; charset=utf-16'],
  ['something that ends like JSON', 'application/problem+json'],
])('refuses %s before reading it', async (_name, type) => {
  const headers = { 'content-type': type };
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', body: '##TITLE= x', headers });
  await expectProblem(response, 'unsupported-media-type');
});

test('refuses a body without a content type', async () => {
  const body = new Uint8Array([1, 2, 3]);
  await expectProblem(await api.send('POST', '/v1/acquisitions', { role: 'pipeline', body }), 'unsupported-media-type');
});

test('refuses a compressed body, which could unfold beyond every limit', async () => {
  const headers = { 'content-type': 'application/json', 'content-encoding': 'gzip' };
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', body: 'x', headers });
  await expectProblem(response, 'unsupported-media-type');
});

test('takes the content type in any case and with a charset of UTF-8', async () => {
  const headers = { 'content-type': 'Application/JSON; charset="UTF-8"' };
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', body: '{}', headers });
  await expectProblem(response, 'invalid-body');
});
