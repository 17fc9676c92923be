import type { RequestHandler } from 'express';
import { serveFiles } from 'swagger-ui-express';

/**
 * Scripts and styles of the pages under `/docs/`. They read `/openapi.json` of this service;
 * the badge of an outside validator is off, so that the pages tell nobody anything.
 */
export function serveDocumentationFiles(): RequestHandler[] {
  return serveFiles(undefined, { swaggerUrl: '/openapi.json', swaggerOptions: { validatorUrl: null } });
}
