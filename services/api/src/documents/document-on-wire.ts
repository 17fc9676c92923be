import type { DocumentKind, StoredDocument } from '@spinassay/store';

/** A stored version as the contract shows it; the body is what was stored, whatever schema is newer. */
export function documentOnWire({ id, version, sha256, createdAt, bodyText }: StoredDocument): object {
  return { id, version, sha256, createdAt, body: JSON.parse(bodyText) };
}

/** The path of exactly this version. */
export function documentPath({ kind, id, version }: Pick<StoredDocument, 'kind' | 'id' | 'version'>): string {
  return `/v1/${plural[kind]}/${id}?version=${version}`;
}

const plural: Readonly<Record<DocumentKind, string>> = {
  compound: 'compounds',
  method: 'methods',
  preparation: 'preparations',
};
