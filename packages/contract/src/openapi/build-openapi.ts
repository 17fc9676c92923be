import { problemCatalogue } from '@spinassay/problems';
import { z } from 'zod';
import { type Operation, problemsOf } from '../operations/operation.ts';
import { operations } from '../operations/operations.ts';

type Json = Record<string, unknown>;

/** Semantic version of the interface; a breaking change raises the first number and says how to move. */
const INTERFACE_VERSION = '0.1.0';

/**
 * The OpenAPI 3.1 description of the whole interface, made from the table of operations and the zod schemas.
 *
 * @source OpenAPI Specification 3.1.0; JSON Schema draft 2020-12
 */
export function buildOpenApi(): Json {
  const all: readonly Operation[] = Object.values(operations);
  return {
    openapi: '3.1.0',
    info: {
      title: 'spinassay',
      version: INTERFACE_VERSION,
      description:
        'Infers shifts, couplings and amounts with their uncertainty from 1D proton NMR acquisitions. ' +
        'Results support trained staff and do not replace an accredited procedure. ' +
        'Every failure is a problem document (RFC 9457) whose type opens a page that explains it.',
    },
    // Relative: the description is the same wherever the service is reached.
    servers: [{ url: '/' }],
    tags: [...new Set(all.map((operation) => operation.tag))].map((name) => ({ name })),
    paths: pathsOf(all),
    components: {
      securitySchemes: {
        accessKey: { type: 'http', scheme: 'bearer', description: 'An access key, sa_<id>_<secret>.' },
      },
      schemas: componentSchemas(),
    },
  };
}

function pathsOf(all: readonly Operation[]): Json {
  const paths: Record<string, Json> = {};
  for (const operation of all) {
    paths[operation.path] = { ...paths[operation.path], [operation.method]: operationObject(operation) };
  }
  return paths;
}

function operationObject(operation: Operation): Json {
  return {
    operationId: operation.operationId,
    tags: [operation.tag],
    summary: operation.summary,
    security: operation.roles === 'open' ? [] : [{ accessKey: [] }],
    'x-roles': operation.roles === 'open' ? [] : [...operation.roles],
    'x-problems': [...problemsOf(operation)],
    ...(parametersOf(operation).length === 0 ? {} : { parameters: parametersOf(operation) }),
    ...(operation.request === undefined ? {} : { requestBody: requestBody(operation.request) }),
    responses: { ...answersOf(operation), ...problemResponses(operation) },
  };
}

function parametersOf(operation: Operation): Json[] {
  const inPath = operation.path.includes('{id}')
    ? [{ name: 'id', in: 'path', required: true, description: 'Id of the item.', schema: { type: 'string' } }]
    : [];
  const inQuery = Object.entries(operation.query?.shape ?? {}).map(([name, schema]) => {
    const { description, ...object } = z.toJSONSchema(schema, { io: 'output' }) as Json;
    const { $schema: _dialect, ...shape } = object;
    return { name, in: 'query', required: false, description, schema: shape };
  });
  const inHeader = Object.entries(operation.requestHeaders ?? {}).map(([name, description]) => {
    return { name, in: 'header', required: false, description, schema: { type: 'string' } };
  });
  return [...inPath, ...inQuery, ...inHeader];
}

function requestBody(request: NonNullable<Operation['request']>): Json {
  const content = Object.entries(request.content).map(([mediaType, { schema, example }]) => [
    mediaType,
    { schema: schema === undefined ? { type: 'string' } : schemaObject(schema), example },
  ]);
  return { required: true, description: `At most ${request.limitBytes} bytes.`, content: Object.fromEntries(content) };
}

function answersOf(operation: Operation): Json {
  const responses: Json = {};
  for (const { status, description, mediaType, schema, example, headers } of operation.answers) {
    const media = {
      ...(schema === undefined ? {} : { schema: schemaObject(schema) }),
      ...(example === undefined ? {} : { example }),
    };
    responses[status] = {
      description,
      ...(headers === undefined ? {} : { headers: headersOf(headers) }),
      ...(mediaType === undefined ? {} : { content: { [mediaType]: media } }),
    };
  }
  return responses;
}

function headersOf(headers: Readonly<Record<string, string>>): Json {
  const entries = Object.entries(headers).map(([name, description]) => [
    name,
    { description, schema: { type: 'string' } },
  ]);
  return Object.fromEntries(entries);
}

/** One response a status, since OpenAPI has no way to give one status two meanings; the slugs stand in its text. */
function problemResponses(operation: Operation): Json {
  const slugsByStatus = new Map<number, string[]>();
  for (const slug of problemsOf(operation)) {
    const { status } = problemCatalogue[slug];
    slugsByStatus.set(status, [...(slugsByStatus.get(status) ?? []), slug]);
  }
  const answered = new Set<number>(operation.answers.map((answer) => answer.status));
  const responses: Json = {};
  for (const [status, slugs] of slugsByStatus) {
    if (answered.has(status)) throw new Error(`${operation.operationId} answers ${status} with a body and a problem`);
    responses[status] = {
      description: slugs.map((slug) => `\`${slug}\``).join(', '),
      content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
    };
  }
  return responses;
}

/** A reference where the schema has an id, else the schema itself. */
function schemaObject(schema: z.ZodType): Json {
  const id = schema.meta()?.id;
  if (id !== undefined) return { $ref: `#/components/schemas/${id}` };
  const { $schema: _dialect, ...object } = z.toJSONSchema(schema, { io: 'input' }) as Json;
  return object;
}

function componentSchemas(): Json {
  const { schemas } = z.toJSONSchema(z.globalRegistry, { uri: (id) => `#/components/schemas/${id}` });
  // The dialect is OpenAPI 3.1's own default and the place in the document is the id: neither is repeated.
  const entries = Object.entries(schemas).map(([id, { $schema: _dialect, $id: _id, ...schema }]) => [id, schema]);
  return Object.fromEntries(entries.sort(([a], [b]) => (String(a) < String(b) ? -1 : 1)));
}
