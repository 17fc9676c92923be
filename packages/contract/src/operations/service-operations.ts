import { healthSchema, readinessSchema } from '../health.ts';
import type { Operation } from './operation.ts';

const readyExample = {
  status: 'ready',
  checks: [
    { name: 'database', passed: true, detail: 'answers' },
    { name: 'migrations', passed: true, detail: 'as this build expects' },
  ],
};
const awayExample = { status: 'not-ready', checks: [{ name: 'database', passed: false, detail: 'does not answer' }] };

/** What operators and readers of the interface ask; none needs a key. */
export const serviceOperations = {
  readHealth: {
    operationId: 'readHealth',
    method: 'get',
    path: '/healthz',
    tag: 'service',
    summary: 'Whether the process answers.',
    roles: 'open',
    answers: [
      {
        status: 200,
        description: 'It does.',
        mediaType: 'application/json',
        schema: healthSchema,
        example: { status: 'alive' },
      },
    ],
    problems: [],
  },
  readReadiness: {
    operationId: 'readReadiness',
    method: 'get',
    path: '/readyz',
    tag: 'service',
    summary: 'Whether requests can be served: database reachable, migrations as expected.',
    roles: 'open',
    answers: [
      {
        status: 200,
        description: 'Ready.',
        mediaType: 'application/json',
        schema: readinessSchema,
        example: readyExample,
      },
      {
        status: 503,
        description: 'Not ready.',
        mediaType: 'application/json',
        schema: readinessSchema,
        example: awayExample,
      },
    ],
    problems: [],
  },
  readOpenApi: {
    operationId: 'readOpenApi',
    method: 'get',
    path: '/openapi.json',
    tag: 'service',
    summary: 'This description, as JSON.',
    roles: 'open',
    answers: [{ status: 200, description: 'OpenAPI 3.1.', mediaType: 'application/json' }],
    problems: [],
  },
  readDocumentation: {
    operationId: 'readDocumentation',
    method: 'get',
    path: '/docs',
    tag: 'service',
    summary: 'This description, as pages.',
    roles: 'open',
    answers: [
      { status: 200, description: 'HTML.', mediaType: 'text/html' },
      { status: 301, description: 'The pages are at /docs/.', headers: { Location: 'Path of the pages.' } },
    ],
    problems: [],
  },
  readProblemPage: {
    operationId: 'readProblemPage',
    method: 'get',
    path: '/problems/{id}',
    tag: 'service',
    summary: 'What a kind of problem means and how to put it right; the URI in its `type`.',
    roles: 'open',
    answers: [{ status: 200, description: 'HTML.', mediaType: 'text/html' }],
    problems: ['unknown-path'],
  },
} as const satisfies Record<string, Operation>;
