import { problemCatalogue } from './catalogue.ts';
import type { ProblemFact, ProblemFault, ProblemRecord } from './problem-record.ts';

/** A problem as it travels: the members of RFC 9457 section 3.1, then extensions at the top level. */
export type ProblemDocument = {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  readonly instance?: string;
  readonly errors?: readonly ProblemFault[];
  readonly [extension: string]: ProblemFact | readonly ProblemFault[] | undefined;
};

/** Where a document is read: the address of the service and the request it answers. */
export type ProblemAddress = {
  /** Scheme, host and port without a path, such as `http://127.0.0.1:8480`. */
  readonly baseUrl: string;
  /** URI reference that names this occurrence, such as `urn:uuid:...` or the path of the fit. */
  readonly instance?: string;
};

/** The media type of every failure (RFC 9457 section 3). */
export const problemMediaType = 'application/problem+json';

const standardMembers = new Set(['type', 'title', 'status', 'detail', 'instance', 'errors']);

/**
 * Address a record to its reader: absolute type URI, constant title, status equal to the HTTP status.
 *
 * @throws RangeError when a fact takes the name of a standard member
 * @source RFC 9457 sections 3.1 and 3.2
 */
export function problemDocument(record: ProblemRecord, address: ProblemAddress): ProblemDocument {
  const kind = problemCatalogue[record.slug];
  const facts = record.facts ?? {};
  for (const name of Object.keys(facts)) {
    if (standardMembers.has(name))
      throw new RangeError(`fact "${name}" would replace a standard member of the problem`);
  }
  return {
    type: problemTypeUri(record.slug, address.baseUrl),
    title: kind.title,
    status: kind.status,
    detail: record.detail,
    ...(address.instance === undefined ? {} : { instance: address.instance }),
    ...(record.errors === undefined ? {} : { errors: record.errors }),
    ...facts,
  };
}

/** The absolute URI of a kind of problem; it opens the page that explains it. */
export function problemTypeUri(slug: string, baseUrl: string): string {
  return `${baseUrl.replace(/\/+$/, '')}/problems/${slug}`;
}
