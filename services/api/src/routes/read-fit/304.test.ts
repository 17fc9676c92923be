import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { finishFit } from '../../../test-support/finish-fit.ts';
import { askForFit } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('answers 304 without a body while nothing has changed, and 200 once it has', async () => {
  const { id } = await askForFit(api);
  const first = await api.send('GET', `/v1/fits/${id}`, { role: 'lims' });
  const etag = first.headers.get('etag') ?? '';
  const headers = { 'if-none-match': etag };
  const unchanged = await api.send('GET', `/v1/fits/${id}`, { role: 'lims', headers });
  expect([unchanged.status, await unchanged.text(), unchanged.headers.get('etag')]).toEqual([304, '', etag]);
  await finishFit(api, 'completed');
  const changed = await api.send('GET', `/v1/fits/${id}`, { role: 'lims', headers });
  expect([changed.status, changed.headers.get('etag') === etag]).toEqual([200, false]);
});

test('takes a list of tags, weak ones and the star (RFC 9110 section 13.1.2)', async () => {
  const { id } = await askForFit(api);
  const first = await api.send('GET', `/v1/fits/${id}`, { role: 'lims' });
  const etag = first.headers.get('etag');
  for (const tags of [`"x", ${etag}`, `W/${etag}`, '*']) {
    const response = await api.send('GET', `/v1/fits/${id}`, { role: 'lims', headers: { 'if-none-match': tags } });
    expect([tags, response.status]).toEqual([tags, 304]);
  }
});
