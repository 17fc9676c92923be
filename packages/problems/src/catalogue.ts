/** One kind of failure a client may see. `slug` and `title` are constant for ever: never renamed, never reused. */
export type ProblemKind = {
  readonly slug: string;
  /** HTTP status of an answer that carries it. Inside a failed job the read itself is 200. */
  readonly status: number;
  readonly title: string;
  /** True when the same request may succeed later without being changed. */
  readonly retryable: boolean;
  /** What it means and how to put it right: the text of the page behind its type URI. */
  readonly remedy: string;
};

/**
 * Every failure a client may see, in one table (RFC 9457; statuses of RFC 9110).
 * `openapi.yaml` and the pages under `/problems/` are held equal to it by tests.
 */
export const problemCatalogue = {
  'malformed-json': {
    slug: 'malformed-json',
    status: 400,
    title: 'The body is not JSON',
    retryable: false,
    remedy: 'Send one JSON value in UTF-8. The detail names the first place that could not be read.',
  },
  'invalid-query': {
    slug: 'invalid-query',
    status: 400,
    title: 'A query parameter or header is not valid',
    retryable: false,
    remedy: 'Correct the parameters listed under errors; each entry names one parameter.',
  },
  'key-missing': {
    slug: 'key-missing',
    status: 401,
    title: 'No access key was given',
    retryable: false,
    remedy: 'Send the header "Authorization: Bearer sa_<id>_<secret>" with a key of your laboratory.',
  },
  'key-unknown': {
    slug: 'key-unknown',
    status: 401,
    title: 'The access key is not known',
    retryable: false,
    remedy: 'The key is mistyped, expired or withdrawn. Ask the administrator of your laboratory for a new one.',
  },
  'role-not-sufficient': {
    slug: 'role-not-sufficient',
    status: 403,
    title: 'The role of this key does not allow the operation',
    retryable: false,
    remedy: 'Use a key that holds one of the roles named in the detail.',
  },
  'unknown-path': {
    slug: 'unknown-path',
    status: 404,
    title: 'There is nothing at this path',
    retryable: false,
    remedy: 'See /openapi.json for the paths that exist.',
  },
  'unknown-resource': {
    slug: 'unknown-resource',
    status: 404,
    title: 'Your laboratory holds no such item',
    retryable: false,
    remedy: 'Check the id and the version. Items of other laboratories are never shown.',
  },
  'method-not-allowed': {
    slug: 'method-not-allowed',
    status: 405,
    title: 'This path does not take the HTTP method',
    retryable: false,
    remedy: 'Use one of the methods in the Allow header.',
  },
  'conditions-differ': {
    slug: 'conditions-differ',
    status: 409,
    title: 'The same signal is already held with other conditions',
    retryable: false,
    remedy:
      'The errors name each condition that differs, with the value held and the value sent. ' +
      'If the conditions held are right, send the signal with those. A signal is never stored twice under two descriptions.',
  },
  'fit-not-completed': {
    slug: 'fit-not-completed',
    status: 409,
    title: 'The fit has no result',
    retryable: true,
    remedy:
      'Read the fit: while it is queued or running, wait for it; when it failed or was cancelled, it never has one.',
  },
  'payload-too-large': {
    slug: 'payload-too-large',
    status: 413,
    title: 'The body is larger than this operation takes',
    retryable: false,
    remedy: 'The detail names the limit in bytes.',
  },
  'unsupported-media-type': {
    slug: 'unsupported-media-type',
    status: 415,
    title: 'The operation does not take this content type',
    retryable: false,
    remedy: 'Send one of the content types named in the detail, without a content encoding.',
  },
  'invalid-body': {
    slug: 'invalid-body',
    status: 422,
    title: 'The body is JSON but does not say what the operation needs',
    retryable: false,
    remedy: 'The errors list every fault at once; each pointer is a JSON Pointer (RFC 6901) into the body.',
  },
  'unreadable-acquisition': {
    slug: 'unreadable-acquisition',
    status: 422,
    title: 'The acquisition could not be read',
    retryable: false,
    remedy: 'The errors list every fault found in the file or signal, with the line where there is one.',
  },
  'unknown-reference': {
    slug: 'unknown-reference',
    status: 422,
    title: 'The body refers to something your laboratory does not hold',
    retryable: false,
    remedy: 'The errors point at each reference. Create what is missing first, or correct the id or the version.',
  },
  'internal-fault': {
    slug: 'internal-fault',
    status: 500,
    title: 'The service failed by its own fault',
    retryable: false,
    remedy: 'Nothing was stored. Report the instance; the log of the service holds the rest.',
  },
  'service-unavailable': {
    slug: 'service-unavailable',
    status: 503,
    title: 'The service cannot answer at the moment',
    retryable: true,
    remedy: 'Send the same request again after the time in the Retry-After header. Asking twice does nothing twice.',
  },
  'analysis-not-possible': {
    slug: 'analysis-not-possible',
    status: 422,
    title: 'The acquisition cannot be analysed by this method',
    retryable: false,
    remedy: 'The detail names what the acquisition or the method would have to change.',
  },
  'analysis-failed': {
    slug: 'analysis-failed',
    status: 500,
    title: 'The analysis failed by its own fault',
    retryable: false,
    remedy:
      'Report the fit. It is not tried again by itself; a failed fit frees its place, so it may be asked for again.',
  },
  'attempts-exhausted': {
    slug: 'attempts-exhausted',
    status: 500,
    title: 'The fit ended its worker too many times',
    retryable: false,
    remedy: 'Each attempt lost its worker before it could finish. Report the fit; it may be asked for again.',
  },
} as const satisfies Record<string, ProblemKind>;

/** The name of one kind of failure. */
export type ProblemSlug = keyof typeof problemCatalogue;
