import { createHash } from 'node:crypto';
import type { Fit } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { finishFit, recordedText } from '../../../test-support/finish-fit.ts';
import { askForFit } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('answers the very bytes that were recorded, under their digest', async () => {
  const { id } = await askForFit(api);
  await finishFit(api, 'completed');
  const response = await api.send('GET', `/v1/fits/${id}/result`, { role: 'lims' });
  const text = await response.text();
  expect([response.status, text]).toEqual([200, recordedText]);
  const digest = createHash('sha256').update(text).digest('hex');
  const fit = (await (await api.send('GET', `/v1/fits/${id}`, { role: 'lims' })).json()) as Fit;
  expect([response.headers.get('etag'), fit.resultSha256]).toEqual([`"${digest}"`, digest]);
  const headers = { 'if-none-match': `"${digest}"` };
  const unchanged = await api.send('GET', `/v1/fits/${id}/result`, { role: 'lims', headers });
  expect([unchanged.status, await unchanged.text()]).toEqual([304, '']);
});
