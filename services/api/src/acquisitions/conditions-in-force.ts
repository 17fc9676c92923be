import type { Conditions } from '@spinassay/contract';

/**
 * The conditions that hold: what was declared wins, the file fills what was not. The sequence is never taken from a
 * file, since its labels are free text and a wrong sequence makes a wrong amount.
 */
export function conditionsInForce(declared: Conditions, fromFile: Conditions): Conditions {
  const { sequence: _labelled, ...rest } = fromFile;
  return { ...rest, ...withoutUndefined(declared) };
}

function withoutUndefined(conditions: Conditions): Conditions {
  return Object.fromEntries(Object.entries(conditions).filter(([, value]) => value !== undefined));
}
