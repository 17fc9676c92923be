import type { Acquisition, Fit, Role } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { createApi } from '../../services/api/src/create-api.ts';
import { type ApiFixture, type Ask, openApiFixture } from '../../services/api/test-support/api-fixture.ts';
import { finishFit } from '../../services/api/test-support/finish-fit.ts';
import { singletCompound } from '../../services/api/test-support/laboratory-content.ts';
import { describedOperations, faultsOfResponse, openApi } from './response-judge.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

/** The example that `openapi.yaml` shows for the body of an operation. */
function exampleOf(operationId: string, mediaType = 'application/json'): unknown {
  const operation = describedOperations.find((candidate) => candidate.operationId === operationId);
  return operation?.requestBody?.content[mediaType]?.example;
}

/** Ask, and hold the answer to the document; gives back what was answered. */
async function asked<T>(operationId: string, path: string, expected: number, ask: Ask = {}): Promise<T> {
  const operation = describedOperations.find((candidate) => candidate.operationId === operationId);
  const response = await api.send(String(operation?.method).toUpperCase(), path, ask);
  const copy = response.clone();
  expect([operationId, response.status, await faultsOfResponse(operationId, response)]).toEqual([
    operationId,
    expected,
    [],
  ]);
  return (copy.headers.get('content-type')?.includes('json') ? await copy.json() : undefined) as T;
}

test('takes every example of openapi.yaml in the order of a laboratory, and answers as the document says', async () => {
  const owner = { role: 'method-owner' as Role };
  const pipeline = { role: 'pipeline' as Role };
  const lims = { role: 'lims' as Role };
  await asked('createCompound', '/v1/compounds', 201, { ...owner, json: exampleOf('createCompound') });
  await asked('createCompound', '/v1/compounds', 200, { ...owner, json: exampleOf('createCompound') });
  await asked('createCompound', '/v1/compounds', 201, {
    ...owner,
    json: singletCompound('trimethylsilylpropanoate-d4', 0),
  });
  await asked('listCompounds', '/v1/compounds', 200, lims);
  await asked('readCompound', '/v1/compounds/acetate?version=1', 200, lims);
  await asked('createMethod', '/v1/methods', 201, { ...owner, json: exampleOf('createMethod') });
  await asked('createMethod', '/v1/methods', 200, { ...owner, json: exampleOf('createMethod') });
  await asked('listMethods', '/v1/methods', 200, lims);
  await asked('readMethod', '/v1/methods/acetate-in-cider', 200, lims);
  await asked('createPreparation', '/v1/preparations', 201, { ...pipeline, json: exampleOf('createPreparation') });
  await asked('createPreparation', '/v1/preparations', 200, { ...pipeline, json: exampleOf('createPreparation') });
  await asked('readPreparation', '/v1/preparations/tank-4-night-17', 200, lims);

  const posted = { ...pipeline, json: exampleOf('createAcquisition') };
  const { id } = await asked<Acquisition>('createAcquisition', '/v1/acquisitions', 201, posted);
  await asked('createAcquisition', '/v1/acquisitions', 200, posted);
  await asked('readAcquisition', `/v1/acquisitions/${id}`, 200, lims);
  await asked('readOriginal', `/v1/acquisitions/${id}/original`, 200, lims);

  const json = { ...(exampleOf('createFit') as object), acquisitionId: id };
  const fit = await asked<Fit>('createFit', '/v1/fits', 202, { ...pipeline, json });
  await asked('createFit', '/v1/fits', 200, { ...pipeline, json });
  await asked('readResult', `/v1/fits/${fit.id}/result`, 409, lims);
  await finishFit(api, 'completed');
  await asked('readFit', `/v1/fits/${fit.id}`, 200, lims);
  await asked('readFit', `/v1/fits/${fit.id}`, 304, { ...lims, headers: { 'if-none-match': '*' } });
  await asked('readResultFeed', '/v1/results', 200, lims);
  for (const [operationId, path] of [
    ['readHealth', '/healthz'],
    ['readReadiness', '/readyz'],
    ['readOpenApi', '/openapi.json'],
    ['readDocumentation', '/docs/'],
    ['readProblemPage', '/problems/invalid-body'],
  ] as const) {
    await asked(operationId, path, 200);
  }
});

test('reads the JCAMP-DX example that openapi.yaml shows', async () => {
  const body = String(exampleOf('createAcquisition', 'chemical/x-jcamp-dx')).replace('500.13', '600.13');
  const headers = { 'content-type': 'chemical/x-jcamp-dx' };
  await asked('createAcquisition', '/v1/acquisitions', 201, { role: 'pipeline', body, headers });
});

test('answers whatever is wrong with a request with a problem that the operation declares', async () => {
  const slugs = new Set<string>();
  for (const { operationId, path, method, responses } of describedOperations) {
    const role =
      operationId.startsWith('createCompound') || operationId.startsWith('createMethod') ? 'method-owner' : 'analyst';
    const type = { 'content-type': 'application/json' };
    const asks: Ask[] = [{}, { role: 'auditor' }, { role: 'lims' }, { role }];
    if (method === 'post') {
      asks.push({ role, body: 'x', headers: { 'content-type': 'text/plain' } });
      asks.push({ role, body: '{', headers: type }, { role, json: {} });
    }
    for (const ask of asks) {
      for (const query of ['', '?unknown=1']) {
        const response = await api.send(method.toUpperCase(), path.replace('{id}', 'nothing') + query, ask);
        expect([operationId, ask, response.status, Object.keys(responses)]).toEqual([
          operationId,
          ask,
          expect.toSatisfy((status: number) => String(status) in responses),
          expect.anything(),
        ]);
        const copy = response.clone();
        expect(await faultsOfResponse(operationId, response)).toEqual([]);
        if (copy.headers.get('content-type') !== 'application/problem+json') continue;
        const slug = String(((await copy.json()) as { type: string }).type.split('/').pop());
        const operation = describedOperations.find((candidate) => candidate.operationId === operationId);
        expect([operationId, operation?.['x-problems']]).toEqual([operationId, expect.arrayContaining([slug])]);
        slugs.add(slug);
      }
    }
  }
  // The walk means nothing unless it met problems of many kinds.
  expect(slugs.size).toBeGreaterThanOrEqual(8);
});

test('serves every operation of openapi.yaml and no other', () => {
  const declared = describedOperations.map(({ method, path }) => `${method} ${path}`).sort();
  const served = routesOf(createApi({} as never)).sort();
  expect(served).toEqual(declared);
});

test('gives every operation an operationId of its own', () => {
  const ids = describedOperations.map(({ operationId }) => operationId);
  expect(ids.length).toBe(new Set(ids).size);
  expect(Object.keys(openApi.paths).length).toBeGreaterThan(10);
});

/** Method and path of every route of the server, as the router itself lists them; `all` is the 405 of a path. */
function routesOf(app: { router: { stack: unknown[] } }): string[] {
  const layers = app.router.stack as { route?: { path: string; methods: Record<string, boolean> } }[];
  return layers.flatMap(({ route }) => {
    if (route === undefined) return [];
    const methods = Object.keys(route.methods).filter((method) => method !== '_all');
    return methods.map((method) => `${method} ${route.path.replaceAll(/:(\w+)/g, '{$1}')}`);
  });
}
