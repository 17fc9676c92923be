import type { Conditions } from '@spinassay/contract';
import { jsonPointer, type ProblemFault } from '@spinassay/problems';

/** Every condition in which the two differ, with the value held and the value sent; empty when they agree. */
export function conditionDifferences(held: Conditions, sent: Conditions): ProblemFault[] {
  const names = [...new Set([...Object.keys(held), ...Object.keys(sent)])].sort() as (keyof Conditions)[];
  return names
    .filter((name) => held[name] !== sent[name])
    .map((name) => ({
      pointer: jsonPointer(['conditions', name]),
      detail: `held: ${shown(held[name])}; sent: ${shown(sent[name])}`,
    }));
}

function shown(value: Conditions[keyof Conditions]): string {
  return value === undefined ? 'undeclared' : JSON.stringify(value);
}
