import type { ProblemSlug } from './catalogue.ts';

/** One fault of the request. `pointer` names a place in the body, `parameter` a query parameter or header. */
export type ProblemFault = {
  /** JSON Pointer as a URI fragment, such as `#/samples/3/massMg` (RFC 6901 section 6). */
  readonly pointer?: string;
  readonly parameter?: string;
  /** 1-based line of the file that was sent, where the fault has one. */
  readonly line?: number;
  /** Kebab-case name of the fault, where the reader gives one. */
  readonly code?: string;
  /** What is wrong and how to put it right. */
  readonly detail: string;
};

/** A fact at the top level of the document: a number, a text or a list of texts. */
export type ProblemFact = number | string | boolean | readonly string[];

/**
 * A failure before it is addressed to anybody: what a failed job stores, and what a service throws.
 * It names no host, so that the same record reads the same wherever the service is reached.
 */
export type ProblemRecord = {
  readonly slug: ProblemSlug;
  /** Tells this caller how to put it right. */
  readonly detail: string;
  readonly errors?: readonly ProblemFault[];
  /** Extension members of RFC 9457 section 3.2; they appear at the top level. */
  readonly facts?: Readonly<Record<string, ProblemFact>>;
};
