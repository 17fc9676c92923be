import type { Acquisition } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { jcampDxExample } from '../../../test-support/jcamp-dx-example.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('gives back the bytes as they came, with their content type, as a file', async () => {
  const body = Buffer.from(jcampDxExample.replaceAll('\n', '\r\n'), 'utf8');
  const headers = { 'content-type': 'chemical/x-jcamp-dx' };
  const posted = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', body, headers });
  const { id } = (await posted.json()) as Acquisition;
  const response = await api.send('GET', `/v1/acquisitions/${id}/original`, { role: 'auditor' });
  expect(Buffer.from(await response.arrayBuffer()).equals(body)).toBe(true);
  expect(response.headers.get('content-type')).toBe('chemical/x-jcamp-dx');
  expect(response.headers.get('content-disposition')).toBe('attachment');
  expect(response.headers.get('x-content-type-options')).toBe('nosniff');
});
