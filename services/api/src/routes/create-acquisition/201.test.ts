import { createHash } from 'node:crypto';
import { type Acquisition, acquisitionSchema } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { jcampDxExample } from '../../../test-support/jcamp-dx-example.ts';
import { signalOf } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('stores a new signal with its declared conditions and says where it is', async () => {
  const conditions = { sequence: 'single-pulse', flipAngleDegrees: 90, solvent: 'D2O' };
  const json = { signal: signalOf(200), conditions };
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json });
  const acquisition = acquisitionSchema.parse(await response.json());
  expect(response.status).toBe(201);
  expect(response.headers.get('location')).toBe(`/v1/acquisitions/${acquisition.id}`);
  expect(acquisition.declaredConditions).toEqual(conditions);
  expect(acquisition.conditions).toMatchObject(conditions);
});

test('addresses the signal by the digest of its scales and float64 samples, whatever it came in', async () => {
  const samples = Float64Array.from({ length: 64 }, (_, position) => position - 32.5);
  const bytes = Buffer.from(samples.buffer);
  const scales = { sampleCount: 32, dwellSeconds: 0.0005, observeFrequencyMHz: 500.13 };
  const signal = { encoding: 'float64', data: bytes.toString('base64'), ...scales };
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json: { signal } });
  const acquisition = (await response.json()) as Acquisition;
  // The layout is the house's own: written out by hand here.
  const header = '{"dwellSeconds":0.0005,"observeFrequencyMHz":500.13}';
  expect(acquisition.signalSha256).toBe(createHash('sha256').update(header).update(bytes).digest('hex'));
});

test('lets what is declared win over the file, fills the rest from the file, and keeps both', async () => {
  const jcampDx = jcampDxExample.replace('##NTUPLES=', '##.SOLVENT NAME= D2O\n##TEMPERATURE= 25\n##NTUPLES=');
  const json = { jcampDx, conditions: { temperatureCelsius: 27, sequence: 'single-pulse' } };
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json });
  const acquisition = (await response.json()) as Acquisition;
  expect(response.status, JSON.stringify(acquisition)).toBe(201);
  expect(acquisition.conditions).toMatchObject({ temperatureCelsius: 27, solvent: 'D2O', sequence: 'single-pulse' });
  expect(acquisition.declaredConditions).toEqual({ temperatureCelsius: 27, sequence: 'single-pulse' });
  expect(acquisition.fileConditions).toMatchObject({ temperatureCelsius: 25, solvent: 'D2O' });
});

test('stores a bare JCAMP-DX file with undeclared sequence', async () => {
  // The carrier frequency differs from the test before: another signal.
  const body = jcampDxExample
    .replace('##.OBSERVE FREQUENCY= 500.13', '##.OBSERVE FREQUENCY= 600.13')
    .replace('##NTUPLES=', '##.PULSE SEQUENCE= single pulse\n##NTUPLES=');
  const headers = { 'content-type': 'chemical/x-jcamp-dx' };
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', body, headers });
  const acquisition = (await response.json()) as Acquisition;
  expect([acquisition.declaredConditions, 'sequence' in acquisition.conditions]).toEqual([{}, false]);
});
