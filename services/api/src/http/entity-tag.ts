import type { Request } from 'express';

/**
 * True when `If-None-Match` names this tag, so that the answer is 304.
 *
 * @param entityTag with its quotes, strong
 * @source RFC 9110 section 13.1.2: a list of tags or `*`, compared weakly (a leading `W/` does not count)
 */
export function isUnchanged(request: Request, entityTag: string): boolean {
  const header = request.get('if-none-match');
  if (header === undefined) return false;
  if (header.trim() === '*') return true;
  return (header.match(/(?:W\/)?"[^"]*"/g) ?? []).some((tag) => tag.replace(/^W\//, '') === entityTag);
}
