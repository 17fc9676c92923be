export { type ProblemKind, type ProblemSlug, problemCatalogue } from './catalogue.ts';
export { jsonPointer } from './json-pointer.ts';
export {
  type ProblemAddress,
  type ProblemDocument,
  problemDocument,
  problemMediaType,
  problemTypeUri,
} from './problem-document.ts';
export { ProblemError } from './problem-error.ts';
export type { ProblemFact, ProblemFault, ProblemRecord } from './problem-record.ts';
