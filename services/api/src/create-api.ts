import { type Operation, type OperationId, operations } from '@spinassay/contract';
import { ProblemError } from '@spinassay/problems';
import express, { type Express, type NextFunction, type Request, type Response } from 'express';
import type { ApiDependencies } from './api-dependencies.ts';
import { handlers } from './handlers.ts';
import { answerFailure } from './http/answer-failure.ts';
import { serveDocumentationFiles } from './http/serve-documentation-files.ts';
import { serveOperation } from './http/serve-operation.ts';

/**
 * The HTTP interface, routed by the table of operations in the contract and by nothing else.
 * It opens and closes nothing: what it is given belongs to the caller.
 */
export function createApi(dependencies: ApiDependencies): Express {
  const app = express();
  app.disable('x-powered-by').disable('etag').set('query parser', 'simple');
  app.use((_request: Request, response: Response, next: NextFunction) => {
    response.set('X-Content-Type-Options', 'nosniff');
    next();
  });
  routeOperations(app, dependencies);
  app.use('/docs', ...serveDocumentationFiles());
  app.use((request: Request) => {
    throw new ProblemError({ slug: 'unknown-path', detail: `There is nothing at ${request.path.slice(0, 200)}.` });
  });
  // Express tells error handlers from others by their four parameters.
  app.use((error: unknown, request: Request, response: Response, _next: NextFunction) => {
    answerFailure(error, { request, response, dependencies });
  });
  return app;
}

function routeOperations(app: Express, dependencies: ApiDependencies): void {
  const entries = Object.entries(operations) as [OperationId, Operation][];
  for (const [operationId, operation] of entries) {
    app[operation.method](routePattern(operation.path), serveOperation(operation, handlers[operationId], dependencies));
  }
  for (const path of new Set(entries.map(([, operation]) => operation.path))) {
    const methods = entries.flatMap(([, operation]) => (operation.path === path ? [operation.method] : []));
    // `route().all` and not `app.all`, which would register every method by name.
    app.route(routePattern(path)).all(refuseMethod(methods));
  }
}

/** `/v1/fits/{id}` of OpenAPI is `/v1/fits/:id` of the router. */
function routePattern(path: string): string {
  return path.replaceAll(/\{(\w+)\}/g, ':$1');
}

/** 405 with the methods that the path takes (RFC 9110 section 15.5.6); whoever takes GET takes HEAD. */
function refuseMethod(methods: readonly Operation['method'][]) {
  const allowed = methods.flatMap((method) => (method === 'get' ? ['GET', 'HEAD'] : [method.toUpperCase()])).join(', ');
  return (request: Request, response: Response): void => {
    response.set('Allow', allowed);
    const detail = `This path takes ${allowed}, not ${request.method}.`;
    throw new ProblemError({ slug: 'method-not-allowed', detail, facts: { allowedMethods: allowed } });
  };
}
