import type { Request } from 'express';

/** Longest wait that is honoured; proxies between here and the client give up after 60 s at the earliest. */
export const WAIT_SECONDS_MAX = 30;

/**
 * Seconds that the client prefers to wait, at most `WAIT_SECONDS_MAX`; undefined when it prefers nothing readable.
 * A preference that cannot be read is ignored, as RFC 7240 section 2 asks.
 *
 * @source RFC 7240 sections 2 and 4.3
 */
export function preferredWaitSeconds(request: Request): number | undefined {
  const preferences = (request.get('prefer') ?? '').split(',');
  for (const preference of preferences) {
    const [name = '', value = ''] = (preference.split(';')[0] ?? '').split('=').map((part) => part.trim());
    // The first of several counts (RFC 7240 section 2).
    if (name.toLowerCase() !== 'wait') continue;
    const digits = value.replace(/^"(.*)"$/, '$1');
    return /^\d{1,9}$/.test(digits) ? Math.min(Number(digits), WAIT_SECONDS_MAX) : undefined;
  }
  return undefined;
}
