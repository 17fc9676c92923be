import type { Operation } from '@spinassay/contract';
import { ProblemError } from '@spinassay/problems';
import express, { type Request } from 'express';

/** A body as it came, with the base of its content type in lower case. */
export type ReceivedBody = { readonly mediaType: string; readonly bytes: Uint8Array };

/**
 * Read the body of an operation: content type first, then size, then the bytes.
 *
 * @throws ProblemError unsupported-media-type, payload-too-large
 */
export async function readBody(request: Request, operation: Operation): Promise<ReceivedBody> {
  const { limitBytes, content } = requestOf(operation);
  const mediaType = acceptedMediaType(request, Object.keys(content));
  const raw = express.raw({ type: () => true, limit: limitBytes, inflate: false });
  await new Promise<void>((resolve, reject) => {
    // express.raw works on the request alone; its response argument is only passed on.
    raw(request, request.res as NonNullable<typeof request.res>, (fault?: unknown) =>
      fault === undefined ? resolve() : reject(faultOf(fault, limitBytes)),
    );
  });
  // Without a body express leaves `body` undefined: that is the empty body.
  return { mediaType, bytes: request.body instanceof Uint8Array ? request.body : new Uint8Array(0) };
}

function requestOf(operation: Operation): NonNullable<Operation['request']> {
  if (operation.request === undefined) throw new Error(`${operation.operationId} takes no body`);
  return operation.request;
}

/** The base type when the operation takes it, in UTF-8 where a charset is named. */
function acceptedMediaType(request: Request, accepted: readonly string[]): string {
  const [base = '', ...parameters] = (request.get('content-type') ?? '')
    .split(';')
    .map((part) => part.trim().toLowerCase());
  const charset = parameters
    .find((parameter) => parameter.startsWith('charset='))
    ?.slice('charset='.length)
    .replaceAll('"', '');
  if (!accepted.includes(base) || !['utf-8', 'us-ascii', undefined].includes(charset)) {
    throw new ProblemError({
      slug: 'unsupported-media-type',
      detail: `Expected ${accepted.join(' or ')} in UTF-8, got ${base === '' ? 'no content type' : request.get('content-type')}.`,
    });
  }
  return base;
}

/** Faults of the body reader by the names it documents; what is not named is passed on as it is. */
function faultOf(fault: unknown, limitBytes: number): unknown {
  const type = fault instanceof Error && 'type' in fault ? fault.type : undefined;
  if (type === 'entity.too.large') {
    const detail = `The body may hold at most ${limitBytes} bytes.`;
    return new ProblemError({ slug: 'payload-too-large', detail, facts: { limitBytes } }, { cause: fault });
  }
  if (type === 'encoding.unsupported') {
    return new ProblemError(
      { slug: 'unsupported-media-type', detail: 'Send the body without a Content-Encoding.' },
      { cause: fault },
    );
  }
  if (type === 'request.aborted' || type === 'request.size.invalid') {
    return new ProblemError(
      { slug: 'malformed-json', detail: 'The body ended before its announced length.' },
      { cause: fault },
    );
  }
  return fault;
}
