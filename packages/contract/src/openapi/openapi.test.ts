import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { Validator } from '@seriousme/openapi-schema-validator';
import { problemCatalogue } from '@spinassay/problems';
import { Ajv2020 } from 'ajv/dist/2020.js';
import addFormats from 'ajv-formats';
import { expect, test } from 'vitest';
import { parse } from 'yaml';
import { type Operation, problemsOf } from '../operations/operation.ts';
import { operations } from '../operations/operations.ts';
import { buildOpenApi } from './build-openapi.ts';
import { openApiText } from './openapi-text.ts';

const committed = readFileSync(fileURLToPath(new URL('../../../../openapi.yaml', import.meta.url)), 'utf8');
const all: readonly [string, Operation][] = Object.entries(operations);

test('holds openapi.yaml equal to the schemas byte by byte', () => {
  expect(openApiText() === committed, 'run: node packages/contract/dist/write-openapi.js').toBe(true);
});

// Outside judge: the OpenAPI Initiative's own JSON Schema of 3.1, as carried by the validator package.
test('is a valid OpenAPI 3.1 document', async () => {
  const validator = new Validator();
  const outcome = await validator.validate(buildOpenApi());
  expect(outcome.errors ?? []).toEqual([]);
  expect(validator.version).toBe('3.1');
});

test('reads back from YAML as the document it was made from', () => {
  expect(parse(committed)).toEqual(JSON.parse(JSON.stringify(buildOpenApi())));
});

// Outside judge: ajv, a general JSON Schema validator, against the committed schemas rather than against zod.
test('shows for every body an example that the committed schemas accept', () => {
  const ajv = new Ajv2020({ strict: false, allErrors: true });
  addFormats.default(ajv);
  // An annotation in JSON Schema; the pattern beside it is what is checked.
  ajv.addFormat('base64', true);
  const document = parse(committed);
  ajv.addSchema({ $id: 'https://spinassay.invalid/openapi', ...document });
  let checkedCount = 0;
  for (const { schema, example, at } of bodiesWithSchema(document)) {
    const absolute = JSON.parse(JSON.stringify(schema).replaceAll('"#/', '"https://spinassay.invalid/openapi#/'));
    const validate = ajv.compile(absolute);
    expect([at, validate(example), validate.errors]).toEqual([at, true, null]);
    checkedCount += 1;
  }
  expect(checkedCount).toBeGreaterThanOrEqual(24);
});

test('files every operation under its operationId, each with a path and method of its own', () => {
  for (const [operationId, operation] of all) expect(operation.operationId).toBe(operationId);
  const places = all.map(([, operation]) => `${operation.method} ${operation.path}`);
  expect(new Set(places).size).toBe(places.length);
});

test('names every kind of HTTP problem in some operation, and no problem that the catalogue lacks', () => {
  const named = new Set(all.flatMap(([, operation]) => problemsOf(operation)));
  // These four travel otherwise: inside a failed fit, or where no operation is.
  const elsewhere = ['analysis-failed', 'analysis-not-possible', 'attempts-exhausted', 'method-not-allowed'];
  expect([...named, ...elsewhere].sort()).toEqual(Object.keys(problemCatalogue).sort());
});

type Media = { schema?: object; example?: unknown };

function bodiesWithSchema(document: {
  paths: Record<string, Record<string, unknown>>;
}): { schema: object; example: unknown; at: string }[] {
  const found: { schema: object; example: unknown; at: string }[] = [];
  const take = (content: Record<string, Media> | undefined, at: string): void => {
    for (const [mediaType, { schema, example }] of Object.entries(content ?? {})) {
      if (mediaType === 'application/problem+json' || schema === undefined) continue;
      found.push({ schema, example, at: `${at} ${mediaType}` });
    }
  };
  for (const [path, methods] of Object.entries(document.paths)) {
    for (const [method, operation] of Object.entries(methods)) {
      const { requestBody, responses } = operation as {
        requestBody?: { content: Record<string, Media> };
        responses: Record<string, { content?: Record<string, Media> }>;
      };
      take(requestBody?.content, `${method} ${path}`);
      for (const [status, response] of Object.entries(responses)) take(response.content, `${method} ${path} ${status}`);
    }
  }
  return found;
}
