import { createHash } from 'node:crypto';
import { type Compound, canonicalJson, compoundSchema } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { singletCompound } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('creates version 1, then version 2 for another body, and keeps both', async () => {
  const first = await api.send('POST', '/v1/compounds', {
    role: 'method-owner',
    json: singletCompound('acetate', 1.91),
  });
  const second = await api.send('POST', '/v1/compounds', {
    role: 'method-owner',
    json: singletCompound('acetate', 1.92),
  });
  expect([first.status, second.status]).toEqual([201, 201]);
  const compound = compoundSchema.parse(await second.json());
  expect([compound.version, second.headers.get('location')]).toEqual([2, '/v1/compounds/acetate?version=2']);
  const old = await api.send('GET', '/v1/compounds/acetate?version=1', { role: 'lims' });
  expect(await old.json()).toEqual(await first.json());
});

test('names the body by the SHA-256 of its canonical JSON', async () => {
  const json = singletCompound('formate', 8.44);
  const response = await api.send('POST', '/v1/compounds', { role: 'method-owner', json });
  const { sha256 } = (await response.json()) as Compound;
  expect(sha256).toBe(createHash('sha256').update(canonicalJson(json.body)).digest('hex'));
});
