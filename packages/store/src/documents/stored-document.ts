/** What exists in versions: the three partitions of the table `document`. */
export type DocumentKind = 'compound' | 'method' | 'preparation';

/** One version; `bodyText` is canonical JSON as it was written, `sha256` is over it. */
export type StoredDocument = {
  readonly kind: DocumentKind;
  readonly id: string;
  readonly version: number;
  readonly name: string;
  readonly bodyText: string;
  readonly sha256: string;
  readonly createdAt: string;
};

/** A version without its body, as lists show it. */
export type DocumentHeading = Omit<StoredDocument, 'bodyText'>;

export type DocumentHeadingRow = {
  kind: DocumentKind;
  id: string;
  version: number;
  name: string;
  sha256: string;
  created_at: Date;
};
export type DocumentRow = DocumentHeadingRow & { body_text: string };

export function documentHeading(row: DocumentHeadingRow): DocumentHeading {
  const { kind, id, version, name, sha256 } = row;
  return { kind, id, version, name, sha256, createdAt: row.created_at.toISOString() };
}

export function storedDocument(row: DocumentRow): StoredDocument {
  return { ...documentHeading(row), bodyText: row.body_text };
}
