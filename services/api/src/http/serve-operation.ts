import { emptyQuerySchema, type Operation } from '@spinassay/contract';
import type { Request, Response } from 'express';
import type { ApiDependencies } from '../api-dependencies.ts';
import type { Answer, Handler } from './answer.ts';
import { answerFailure } from './answer-failure.ts';
import { parseQuery } from './parse-query.ts';

/** Run one handler and write what it decided, or the problem it threw, to the socket; log one event for both. */
export function serveOperation(operation: Operation, handler: Handler, dependencies: ApiDependencies) {
  return async (request: Request, response: Response): Promise<void> => {
    const startedAt = performance.now();
    try {
      if (operation.query === undefined) parseQuery(emptyQuerySchema, request);
      const answer = await handler(request, dependencies);
      // A connection kept for later would hold up a service that wants to leave.
      if (dependencies.draining.aborted) response.set('Connection', 'close');
      writeAnswer(response, answer);
    } catch (error) {
      answerFailure(error, { request, response, dependencies });
    }
    const durationMilliseconds = Math.round(performance.now() - startedAt);
    const { operationId } = operation;
    dependencies.logger.info(
      { operationId, httpStatus: response.statusCode, durationMilliseconds },
      'request-answered',
    );
  };
}

function writeAnswer(response: Response, { status, headers = {}, json, bytes }: Answer): void {
  response.status(status).set(headers);
  if (json !== undefined) {
    response.json(json);
  } else if (bytes === undefined) {
    response.end();
  } else {
    // `send` would add a charset to every text; the headers say what the bytes are.
    response.set('Content-Length', String(Buffer.byteLength(bytes)));
    response.end(response.req.method === 'HEAD' ? undefined : bytes);
  }
}
