import { randomUUID } from 'node:crypto';
import { problemDocument, problemMediaType } from '@spinassay/problems';
import type { Request, Response } from 'express';
import type { ApiDependencies } from '../api-dependencies.ts';
import { translateFailure } from './translate-failure.ts';

/** Where a failure happened, and whom it is told to. */
export type FailureContext = {
  readonly request: Request;
  readonly response: Response;
  readonly dependencies: Pick<ApiDependencies, 'baseUrl' | 'logger'>;
};

/** Answer a failure as an RFC 9457 document and log it under the instance that the client sees. */
export function answerFailure(error: unknown, { request, response, dependencies }: FailureContext): void {
  const { record, headers } = translateFailure(error);
  const instance = `urn:uuid:${randomUUID()}`;
  const document = problemDocument(record, { baseUrl: dependencies.baseUrl(), instance });
  const event = { instance, problem: record.slug, httpMethod: request.method, path: request.path };
  if (document.status >= 500) dependencies.logger.error({ ...event, err: error }, 'request-failed');
  else dependencies.logger.info(event, 'request-refused');
  // The client left while it was still sending: nobody is there to be answered.
  if (response.headersSent || response.destroyed) return;
  response.status(document.status).set(headers).set('Cache-Control', 'no-store');
  response.set('Content-Type', problemMediaType).end(JSON.stringify(document));
}
