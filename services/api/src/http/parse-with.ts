import { jsonPointer, type ProblemFault } from '@spinassay/problems';
import type { z } from 'zod';
import { problemWithFaults } from './problem-with-faults.ts';

/**
 * The body as its schema has it.
 *
 * @throws ProblemError invalid-body with every fault at once
 */
export function parseWith<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const faults = parsed.error.issues.flatMap(faultsOf);
  throw problemWithFaults({ slug: 'invalid-body', subject: 'The body', faults });
}

/** An unknown member is a fault of its own, at its own place; every other issue is one fault. */
function faultsOf(issue: z.core.$ZodIssue): ProblemFault[] {
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      pointer: jsonPointer([...issue.path, key]),
      detail: 'this member is not known here',
    }));
  }
  return [{ pointer: jsonPointer(issue.path), detail: sentenceOf(issue) }];
}

function sentenceOf(issue: z.core.$ZodIssue): string {
  if (issue.code === 'invalid_type' && issue.message.endsWith('received undefined')) {
    return `this member is missing: expected ${issue.expected}`;
  }
  return issue.message.replace(/^Invalid input: /, '');
}
