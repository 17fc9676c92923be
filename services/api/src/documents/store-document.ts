import { canonicalJson, sha256Hex } from '@spinassay/contract';
import { createDocumentVersion, type DocumentKind, type LaboratoryTransaction } from '@spinassay/store';
import type { Answer } from '../http/answer.ts';
import { documentOnWire, documentPath } from './document-on-wire.ts';

/** A body that passed its schema and its references. */
export type DocumentDraft = {
  readonly kind: DocumentKind;
  readonly id: string;
  readonly name: string;
  readonly body: unknown;
};

/** Write the body as version 1 or the next version, 201; 200 with the latest version when that has this very body. */
export async function storeDocument(transaction: LaboratoryTransaction, draft: DocumentDraft): Promise<Answer> {
  const { kind, id, name, body } = draft;
  const bodyText = canonicalJson(body);
  const stored = await createDocumentVersion(transaction, { kind, id, name, bodyText, sha256: sha256Hex(bodyText) });
  return {
    status: stored.outcome === 'created' ? 201 : 200,
    headers: { Location: documentPath(stored.document) },
    json: documentOnWire(stored.document),
  };
}
