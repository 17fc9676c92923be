import type { Operation } from '@spinassay/contract';
import { type DocumentKind, listLatestDocuments } from '@spinassay/store';
import type { Request } from 'express';
import type { ApiDependencies } from '../api-dependencies.ts';
import type { Answer } from '../http/answer.ts';
import { authorise } from '../http/authorise.ts';

/** Answer the latest version of every document of a kind, without bodies, in order of id. */
export async function listDocuments(
  request: Request,
  dependencies: ApiDependencies,
  { operation, kind }: { readonly operation: Operation; readonly kind: DocumentKind },
): Promise<Answer> {
  const principal = await authorise(request, operation, dependencies);
  const documents = await dependencies.store.withLaboratory(principal.laboratoryId, (transaction) =>
    listLatestDocuments(transaction, kind),
  );
  const items = documents.map(({ id, version, sha256, createdAt, name }) => ({ id, version, sha256, createdAt, name }));
  return { status: 200, json: { items } };
}
