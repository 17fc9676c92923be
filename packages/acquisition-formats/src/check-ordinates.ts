import type { FaultList } from './fault-list.ts';
import type { PrintedNumber, TupleVariable } from './tuple-variables.ts';

/** Rounding allowed in FIRST, LAST, MIN and MAX beyond their printing: single-precision writers, of the largest ordinate. */
const ORDINATE_TOLERANCE = 1e-6;

/** Compare decoded ordinates with FIRST, LAST, MIN and MAX of their variable, each where the file gives it. */
export function checkOrdinates(
  ordinates: Float64Array,
  variable: TupleVariable,
  line: number,
  faults: FaultList,
): void {
  const found = extremes(ordinates);
  const slack = ORDINATE_TOLERANCE * Math.max(Math.abs(found.min), Math.abs(found.max));
  const compare = (name: string, stated: PrintedNumber | undefined, value: number): void => {
    if (stated === undefined || Math.abs(stated.value - value) <= slack + stated.halfUnit) return;
    const detail = `##${name}= of ${variable.symbol} is ${stated.value}, the table has ${value}: the table or FACTOR is damaged`;
    faults.add('ordinate-check-failed', detail, { line });
  };
  compare('FIRST', variable.first, ordinates[0] ?? Number.NaN);
  compare('LAST', variable.last, ordinates[ordinates.length - 1] ?? Number.NaN);
  compare('MIN', variable.min, found.min);
  compare('MAX', variable.max, found.max);
}

function extremes(values: Float64Array): { readonly min: number; readonly max: number } {
  let [min, max] = [Infinity, -Infinity];
  for (const value of values) {
    if (value < min) min = value;
    if (value > max) max = value;
  }
  return { min, max };
}
