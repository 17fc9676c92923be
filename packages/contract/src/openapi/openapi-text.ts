import { stringify } from 'yaml';
import { buildOpenApi } from './build-openapi.ts';

/** The committed text of `openapi.yaml`. The same code gives the same bytes. */
export function openApiText(): string {
  const head =
    '# Made from packages/contract by "node packages/contract/dist/write-openapi.js"; edit the schemas, not this file.\n';
  return head + stringify(buildOpenApi(), { lineWidth: 120, aliasDuplicateObjects: false });
}
