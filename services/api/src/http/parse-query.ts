import { checkShape, type WireSchema, type WireValue } from '@spinassay/contract';
import type { Request } from 'express';
import { problemWithFaults } from './problem-with-faults.ts';

/**
 * The query parameters as their schema has them. A parameter that is not known is a fault too.
 *
 * @throws ProblemError invalid-query with every fault at once
 */
export function parseQuery<S extends WireSchema>(schema: S, request: Request): WireValue<S> {
  const checked = checkShape(schema, request.query);
  if (checked.ok) return checked.value;
  const faults = checked.faults.map(({ path, detail }) => ({ parameter: String(path[0]), detail }));
  throw problemWithFaults({ slug: 'invalid-query', subject: 'The query', faults });
}
