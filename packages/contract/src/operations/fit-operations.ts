import { feedPageExample, fitExample, fitPostExample, queuedFitExample } from '../examples/fit-examples.ts';
import { resultBodyExample } from '../examples/result-example.ts';
import { feedPageSchema } from '../feed.ts';
import { fitPostSchema, fitSchema } from '../fit.ts';
import { feedQuerySchema } from '../queries.ts';
import { resultBodySchema } from '../result-body.ts';
import { roles } from '../roles.ts';
import type { Operation } from './operation.ts';

/** A fit names its inputs; it carries none. */
const FIT_LIMIT_BYTES = 64 * 1024;

const fitAnswer = { mediaType: 'application/json', schema: fitSchema } as const;

/** Asking for fits, following them, reading results and the feed. */
export const fitOperations = {
  createFit: {
    operationId: 'createFit',
    method: 'post',
    path: '/v1/fits',
    tag: 'fits',
    summary:
      'Ask for a fit. The same acquisition, conditions, preparation, method version and options are the same fit.',
    roles: ['pipeline', 'analyst'],
    request: {
      limitBytes: FIT_LIMIT_BYTES,
      content: { 'application/json': { schema: fitPostSchema, example: fitPostExample } },
    },
    answers: [
      {
        status: 202,
        description: 'Queued.',
        ...fitAnswer,
        example: queuedFitExample,
        headers: { Location: 'Path of the fit.' },
      },
      {
        status: 200,
        description: 'This fit was already asked for.',
        ...fitAnswer,
        example: fitExample,
        headers: { Location: 'Path of the fit.' },
      },
    ],
    problems: ['unknown-reference'],
  },
  readFit: {
    operationId: 'readFit',
    method: 'get',
    path: '/v1/fits/{id}',
    tag: 'fits',
    summary: 'Read how far a fit is. A failed fit is read with 200 and carries its problem.',
    roles,
    requestHeaders: {
      Prefer: 'wait=N answers when the fit is final, or after N seconds, at most 30 (RFC 7240).',
      'If-None-Match':
        'An ETag of this fit: 304 while nothing has changed (RFC 9110). With Prefer, waits for a change.',
    },
    answers: [
      {
        status: 200,
        description: 'The fit.',
        ...fitAnswer,
        example: fitExample,
        headers: { ETag: 'Changes whenever the answer does.', 'Preference-Applied': 'wait, when it was honoured.' },
      },
      { status: 304, description: 'Unchanged.', headers: { ETag: 'The same.' } },
    ],
    problems: ['unknown-resource'],
  },
  readResult: {
    operationId: 'readResult',
    method: 'get',
    path: '/v1/fits/{id}/result',
    tag: 'fits',
    summary: 'Read the result of a completed fit: always the same bytes.',
    roles,
    requestHeaders: { 'If-None-Match': 'The ETag of this result: 304 (RFC 9110).' },
    answers: [
      {
        status: 200,
        description: 'Canonical JSON; its SHA-256 is the resultSha256 of the fit.',
        mediaType: 'application/json',
        schema: resultBodySchema,
        example: resultBodyExample,
        headers: { ETag: 'The SHA-256 of the bytes.' },
      },
      { status: 304, description: 'Unchanged.', headers: { ETag: 'The same.' } },
    ],
    problems: ['unknown-resource', 'fit-not-completed'],
  },
  readResultFeed: {
    operationId: 'readResultFeed',
    method: 'get',
    path: '/v1/results',
    tag: 'results',
    summary: 'Collect what happened to results since a cursor, in commit order, nothing skipped.',
    roles: ['lims', 'analyst', 'auditor', 'admin'],
    query: feedQuerySchema,
    answers: [
      {
        status: 200,
        description: 'A page of events.',
        mediaType: 'application/json',
        schema: feedPageSchema,
        example: feedPageExample,
      },
    ],
    problems: [],
  },
} as const satisfies Record<string, Operation>;
