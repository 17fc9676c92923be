import type { Request } from 'express';
import type { z } from 'zod';
import { problemWithFaults } from './problem-with-faults.ts';

/**
 * The query parameters as their schema has them. A parameter that is not known is a fault too.
 *
 * @throws ProblemError invalid-query with every fault at once
 */
export function parseQuery<S extends z.ZodObject>(schema: S, request: Request): z.output<S> {
  const parsed = schema.safeParse(request.query);
  if (parsed.success) return parsed.data;
  const faults = parsed.error.issues.flatMap((issue) =>
    issue.code === 'unrecognized_keys'
      ? issue.keys.map((parameter) => ({ parameter, detail: 'this parameter is not known here' }))
      : [{ parameter: String(issue.path[0]), detail: issue.message }],
  );
  throw problemWithFaults({ slug: 'invalid-query', subject: 'The query', faults });
}
