import { buildOpenApi } from '@spinassay/contract';
import type { Handler } from '../../http/answer.ts';

/** Made when first asked for, a tenth of a second's work; it cannot change while the process lives. */
let text: string | undefined;

/** `GET /openapi.json`: the committed description, as JSON. */
export const readOpenApi: Handler = async () => {
  text ??= JSON.stringify(buildOpenApi());
  return { status: 200, headers: { 'Content-Type': 'application/json; charset=utf-8' }, bytes: text };
};
