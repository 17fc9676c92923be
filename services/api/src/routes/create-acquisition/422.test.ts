import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { expectProblem, pointersOf } from '../../../test-support/expect-problem.ts';
import { jcampDxExample } from '../../../test-support/jcamp-dx-example.ts';
import { signalOf } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('lists every fault of the body at once, each with a JSON Pointer', async () => {
  const json = {
    signal: { ...signalOf(100), dwellSeconds: -1, nucleus: '13C' },
    conditions: { flipAngleDegrees: 0, 'pulse/power': 3, pH: 'six' },
  };
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json });
  const problem = await expectProblem(response, 'invalid-body');
  expect(pointersOf(problem).sort()).toEqual([
    '#/conditions/flipAngleDegrees',
    '#/conditions/pH',
    '#/conditions/pulse~1power',
    '#/signal/dwellSeconds',
    '#/signal/nucleus',
  ]);
});

test('says what is missing', async () => {
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json: { signal: {} } });
  const problem = await expectProblem(response, 'invalid-body');
  expect(problem.errors).toContainEqual({
    pointer: '#/signal/dwellSeconds',
    detail: 'this member is missing: expected number',
  });
});

test('refuses numbers that are fewer than they say', async () => {
  const signal = { ...signalOf(100), sampleCount: 33 };
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json: { signal } });
  const problem = await expectProblem(response, 'unreadable-acquisition');
  expect(pointersOf(problem).every((pointer) => pointer?.startsWith('#/signal'))).toBe(true);
});

test('refuses samples that are not finite', async () => {
  const data = Buffer.from(new Float32Array(64).fill(Number.NaN).buffer).toString('base64');
  const json = { signal: { ...signalOf(100), data } };
  await expectProblem(await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json }), 'unreadable-acquisition');
});

test('refuses a file that is no JCAMP-DX and says what is wrong with it', async () => {
  const headers = { 'content-type': 'chemical/x-jcamp-dx' };
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', body: 'hello', headers });
  const problem = await expectProblem(response, 'unreadable-acquisition');
  expect(problem.errors?.length).toBeGreaterThan(0);
});

test('refuses a file that says something that cannot be', async () => {
  const headers = { 'content-type': 'chemical/x-jcamp-dx' };
  const body = jcampDxExample.replace('##NTUPLES=', '##TEMPERATURE= -500\n##NTUPLES=');
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', body, headers });
  const { errors } = await expectProblem(response, 'unreadable-acquisition');
  expect(errors?.map(({ code }) => code)).toEqual(['impossible-condition']);
});

test('names the line of a fault in a file, and the member when the file came inside JSON', async () => {
  const jcampDx = jcampDxExample.replace('263 287', '263 2x7');
  const response = await api.send('POST', '/v1/acquisitions', { role: 'pipeline', json: { jcampDx } });
  const { errors } = await expectProblem(response, 'unreadable-acquisition');
  // The line is counted by hand in the example: the second line of the first table.
  expect(errors?.[0]).toMatchObject({ pointer: '#/jcampDx', line: 25 });
});
