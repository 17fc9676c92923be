import { type Operation, slugSchema, versionQuerySchema } from '@spinassay/contract';
import { ProblemError } from '@spinassay/problems';
import { type DocumentKind, findDocument } from '@spinassay/store';
import type { Request } from 'express';
import type { ApiDependencies } from '../api-dependencies.ts';
import type { Answer } from '../http/answer.ts';
import { authorise } from '../http/authorise.ts';
import { parseQuery } from '../http/parse-query.ts';
import { documentOnWire } from './document-on-wire.ts';

/**
 * Answer one version of a document of the caller's laboratory, the latest unless `?version=` names another.
 *
 * @throws ProblemError unknown-resource for what is not there, not in this laboratory, or not a name at all
 */
export async function readDocument(
  request: Request,
  dependencies: ApiDependencies,
  { operation, kind }: { readonly operation: Operation; readonly kind: DocumentKind },
): Promise<Answer> {
  const principal = await authorise(request, operation, dependencies);
  const { version } = parseQuery(versionQuerySchema, request);
  const id = String(request.params['id']);
  const document = slugSchema.safeParse(id).success
    ? await dependencies.store.withLaboratory(principal.laboratoryId, (transaction) =>
        findDocument(transaction, { kind, id, ...(version === undefined ? {} : { version }) }),
      )
    : undefined;
  if (document === undefined) {
    const which = version === undefined ? '' : ` in version ${version}`;
    throw new ProblemError({ slug: 'unknown-resource', detail: `There is no ${kind} "${id.slice(0, 80)}"${which}.` });
  }
  return { status: 200, json: documentOnWire(document) };
}
