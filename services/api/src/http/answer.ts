import type { Request } from 'express';
import type { ApiDependencies } from '../api-dependencies.ts';

/** What a handler decided, before it is written to a socket. */
export type Answer = {
  readonly status: number;
  readonly headers?: Readonly<Record<string, string>>;
  /** A value sent as JSON, or text or bytes sent as they are with the Content-Type in `headers`. */
  readonly json?: unknown;
  readonly bytes?: string | Uint8Array;
};

/** One operation: authorise, parse, decide, write, answer. Failures are thrown. */
export type Handler = (request: Request, dependencies: ApiDependencies) => Promise<Answer>;
