import type { ProblemSlug } from '@spinassay/problems';
import type { z } from 'zod';
import type { Role } from '../roles.ts';

/** What an operation takes as its body, and how large that may be. */
export type OperationRequest = {
  readonly limitBytes: number;
  readonly content: Readonly<
    Record<string, { readonly schema?: z.ZodType; readonly description?: string; readonly example: unknown }>
  >;
};

/** One answer that is not a failure. */
export type OperationAnswer = {
  readonly status: 200 | 201 | 202 | 301 | 304 | 503;
  readonly description: string;
  readonly mediaType?: string;
  readonly schema?: z.ZodType;
  readonly example?: unknown;
  readonly headers?: Readonly<Record<string, string>>;
};

/** One operation of the interface: the server is routed by it and `openapi.yaml` is made from it. */
export type Operation = {
  readonly operationId: string;
  readonly method: 'get' | 'post';
  /** Path template with `{id}` where the id of the item stands. */
  readonly path: string;
  readonly tag: string;
  readonly summary: string;
  /** Roles that may ask; `open` needs no key. */
  readonly roles: readonly Role[] | 'open';
  /** Query parameters, each with a description; absent when the operation takes none. */
  readonly query?: z.ZodObject;
  /** Request headers beyond those of HTTP itself, with what they do. */
  readonly requestHeaders?: Readonly<Record<string, string>>;
  readonly request?: OperationRequest;
  readonly answers: readonly OperationAnswer[];
  /** Failures beyond those that every operation shares (see `problemsOf`). */
  readonly problems: readonly ProblemSlug[];
};

const shared: readonly ProblemSlug[] = ['invalid-query', 'internal-fault'];
const behindKey: readonly ProblemSlug[] = ['key-missing', 'key-unknown', 'role-not-sufficient', 'service-unavailable'];
const withBody: readonly ProblemSlug[] = [
  'payload-too-large',
  'unsupported-media-type',
  'malformed-json',
  'invalid-body',
];

/** Every failure an operation may answer with, those it shares with others included, each once. */
export function problemsOf(operation: Operation): readonly ProblemSlug[] {
  return [
    ...new Set([
      ...shared,
      ...(operation.roles === 'open' ? [] : behindKey),
      ...(operation.request === undefined ? [] : withBody),
      ...operation.problems,
    ]),
  ];
}
