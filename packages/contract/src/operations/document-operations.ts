import type { ProblemSlug } from '@spinassay/problems';
import type { z } from 'zod';
import {
  compoundExample,
  compoundPostExample,
  documentListExample,
  methodExample,
  methodPostExample,
  preparationExample,
  preparationPostExample,
} from '../examples/document-examples.ts';
import { versionQuerySchema } from '../queries.ts';
import { type Role, roles } from '../roles.ts';
import {
  compoundPostSchema,
  compoundSchema,
  documentListSchema,
  methodPostSchema,
  methodSchema,
  preparationPostSchema,
  preparationSchema,
} from '../versioned-documents.ts';
import type { Operation } from './operation.ts';

/** A compound with 50 spin systems and all its citations is under 200 kB. */
const DOCUMENT_LIMIT_BYTES = 1024 * 1024;

type Kind = {
  readonly noun: string;
  readonly plural: string;
  readonly authors: readonly Role[];
  readonly post: z.ZodType;
  readonly posted: unknown;
  readonly schema: z.ZodType;
  readonly example: unknown;
};

const compounds: Kind = {
  noun: 'compound',
  plural: 'compounds',
  authors: ['method-owner'],
  post: compoundPostSchema,
  posted: compoundPostExample,
  schema: compoundSchema,
  example: compoundExample,
};
const methods: Kind = {
  noun: 'method',
  plural: 'methods',
  authors: ['method-owner'],
  post: methodPostSchema,
  posted: methodPostExample,
  schema: methodSchema,
  example: methodExample,
};
const preparations: Kind = {
  noun: 'preparation',
  plural: 'preparations',
  authors: ['pipeline', 'analyst'],
  post: preparationPostSchema,
  posted: preparationPostExample,
  schema: preparationSchema,
  example: preparationExample,
};

/** Versioned documents: compounds, methods and preparations behave alike. */
export const documentOperations = {
  createCompound: creation('createCompound', compounds, []),
  listCompounds: listing('listCompounds', compounds),
  readCompound: reading('readCompound', compounds),
  createMethod: creation('createMethod', methods, ['unknown-reference']),
  listMethods: listing('listMethods', methods),
  readMethod: reading('readMethod', methods),
  createPreparation: creation('createPreparation', preparations, ['unknown-reference']),
  readPreparation: reading('readPreparation', preparations),
} as const satisfies Record<string, Operation>;

function creation(operationId: string, kind: Kind, problems: readonly ProblemSlug[]): Operation {
  const answer = { mediaType: 'application/json', schema: kind.schema, example: kind.example };
  const headers = { Location: `Path of this version of the ${kind.noun}.` };
  return {
    operationId,
    method: 'post',
    path: `/v1/${kind.plural}`,
    tag: kind.plural,
    summary: `Create version 1 of a ${kind.noun}, or its next version. The body of the latest version again answers 200.`,
    roles: kind.authors,
    request: {
      limitBytes: DOCUMENT_LIMIT_BYTES,
      content: { 'application/json': { schema: kind.post, example: kind.posted } },
    },
    answers: [
      { status: 201, description: 'A new version.', ...answer, headers },
      { status: 200, description: 'The latest version has this body.', ...answer, headers },
    ],
    problems,
  };
}

function listing(operationId: string, kind: Kind): Operation {
  return {
    operationId,
    method: 'get',
    path: `/v1/${kind.plural}`,
    tag: kind.plural,
    summary: `List the latest version of each ${kind.noun}.`,
    roles,
    answers: [
      {
        status: 200,
        description: `The latest version of each ${kind.noun}, without bodies.`,
        mediaType: 'application/json',
        schema: documentListSchema,
        example: documentListExample,
      },
    ],
    problems: [],
  };
}

function reading(operationId: string, kind: Kind): Operation {
  return {
    operationId,
    method: 'get',
    path: `/v1/${kind.plural}/{id}`,
    tag: kind.plural,
    summary: `Read a ${kind.noun}, the latest version unless another is named.`,
    roles,
    query: versionQuerySchema,
    answers: [
      {
        status: 200,
        description: `The ${kind.noun}.`,
        mediaType: 'application/json',
        schema: kind.schema,
        example: kind.example,
      },
    ],
    problems: ['unknown-resource'],
  };
}
