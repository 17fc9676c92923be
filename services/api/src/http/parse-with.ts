import { checkShape, type WireSchema, type WireValue } from '@spinassay/contract';
import { jsonPointer } from '@spinassay/problems';
import { problemWithFaults } from './problem-with-faults.ts';

/**
 * The body as its schema has it.
 *
 * @throws ProblemError invalid-body with every fault at once
 */
export function parseWith<S extends WireSchema>(schema: S, value: unknown): WireValue<S> {
  const checked = checkShape(schema, value);
  if (checked.ok) return checked.value;
  const faults = checked.faults.map(({ path, detail }) => ({ pointer: jsonPointer(path), detail }));
  throw problemWithFaults({ slug: 'invalid-body', subject: 'The body', faults });
}
