import { ProblemError, type ProblemFault, type ProblemSlug } from '@spinassay/problems';

/** Most faults listed in one problem, so that a hostile body does not make a larger answer. */
const FAULT_COUNT_MAX = 100;

/** What is faulty, as the sentence names it (`The body`), and every fault of it. */
export type FaultyRequest = {
  readonly slug: ProblemSlug;
  readonly subject: string;
  readonly faults: readonly ProblemFault[];
};

/** A problem that counts all faults and lists the first of them. */
export function problemWithFaults({ slug, subject, faults }: FaultyRequest): ProblemError {
  const errors = faults.slice(0, FAULT_COUNT_MAX);
  const count = faults.length === 1 ? '1 fault' : `${faults.length} faults`;
  const cut = errors.length < faults.length ? `; the first ${errors.length} are listed` : '';
  return new ProblemError({ slug, detail: `${subject} has ${count}${cut}.`, errors });
}
