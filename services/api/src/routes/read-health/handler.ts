import type { Health } from '@spinassay/contract';
import type { Handler } from '../../http/answer.ts';

/** `GET /healthz`: the process answers; it asks nobody. */
export const readHealth: Handler = async () => {
  const json: Health = { status: 'alive' };
  return { status: 200, headers: { 'Cache-Control': 'no-store' }, json };
};
