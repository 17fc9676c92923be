import { ProblemError } from '@spinassay/problems';

/**
 * One JSON value in UTF-8 (RFC 8259).
 *
 * @throws ProblemError malformed-json, saying what came first that could not be read
 */
export function parseJson(bytes: Uint8Array): unknown {
  if (bytes.length === 0) throw new ProblemError({ slug: 'malformed-json', detail: 'The body is empty.' });
  return parseText(decode(bytes));
}

function decode(bytes: Uint8Array): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch (cause) {
    throw new ProblemError({ slug: 'malformed-json', detail: 'The body is not UTF-8.' }, { cause });
  }
}

function parseText(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (cause) {
    const message = cause instanceof Error ? cause.message : 'unreadable';
    throw new ProblemError({ slug: 'malformed-json', detail: `The body is not JSON: ${message}.` }, { cause });
  }
}
