import type { z } from 'zod';

/** A schema of the wire, for rooms that check with it and need not know the library it is written in. */
export type WireSchema = z.ZodType;

/** What a schema makes of a value that passes it. */
export type WireValue<S extends WireSchema> = z.output<S>;

/** One way in which a value is not what its schema says: where, as keys from the root, and what is wrong. */
export type ShapeFault = { readonly path: readonly PropertyKey[]; readonly detail: string };

/** A value that passes, or everything that is wrong with it. */
export type CheckedShape<T> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly faults: readonly ShapeFault[] };

/** Check a value against a schema and tell every fault at once. */
export function checkShape<S extends WireSchema>(schema: S, value: unknown): CheckedShape<WireValue<S>> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return { ok: true, value: parsed.data };
  return { ok: false, faults: parsed.error.issues.flatMap(faultsOf) };
}

/** An unknown member is a fault of its own, at its own place; every other issue is one fault. */
function faultsOf(issue: z.core.$ZodIssue): ShapeFault[] {
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({ path: [...issue.path, key], detail: 'this name is not known here' }));
  }
  return [{ path: issue.path, detail: sentenceOf(issue) }];
}

function sentenceOf(issue: z.core.$ZodIssue): string {
  if (issue.code === 'invalid_type' && issue.message.endsWith('received undefined')) {
    return `this member is missing: expected ${issue.expected}`;
  }
  return issue.message.replace(/^Invalid input: /, '');
}
