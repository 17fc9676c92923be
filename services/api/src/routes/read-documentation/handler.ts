import { generateHTML } from 'swagger-ui-express';
import type { Handler } from '../../http/answer.ts';

/** Where the pages are; their links are relative, so the path has to end in a slash. */
const PATH = '/docs/';

/** The pages' own scripts and styles, inline styles and pictures; nothing from anywhere else. */
const CONTENT_SECURITY_POLICY = [
  "default-src 'none'",
  "script-src 'self'",
  "style-src 'self' 'unsafe-inline'",
  "img-src 'self' data:",
  "connect-src 'self'",
  "frame-ancestors 'none'",
  "base-uri 'none'",
].join('; ');

/** `GET /docs`: the description as pages. Their scripts are served by `serveDocumentationFiles`. */
export const readDocumentation: Handler = async (request) => {
  if (!request.path.endsWith('/')) return { status: 301, headers: { Location: PATH } };
  const bytes = generateHTML(undefined, { customSiteTitle: 'spinassay' });
  const headers = { 'Content-Type': 'text/html; charset=utf-8', 'Content-Security-Policy': CONTENT_SECURITY_POLICY };
  return { status: 200, headers, bytes };
};
