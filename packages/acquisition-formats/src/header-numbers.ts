import { parseNumber } from './affn-number.ts';
import type { FaultList } from './fault-list.ts';
import type { RecordSheet } from './record-sheet.ts';

/** What a header number must be. */
export type NumberDemand = {
  readonly min?: number;
  readonly max?: number;
  /** True where min itself is too small. */
  readonly isMinExcluded?: boolean;
  readonly isInteger?: boolean;
  /** Said where the label is absent; without it, absence is no fault. */
  readonly whenMissing?: string;
};

/** Read one number of the header. Undefined when it is absent or at fault. */
export function readHeaderNumber(
  sheet: RecordSheet,
  label: string,
  demand: NumberDemand,
  faults: FaultList,
): number | undefined {
  const written = sheet.textOf(label);
  if (written === undefined) {
    if (demand.whenMissing !== undefined) {
      faults.add('missing-label', `the file has no ##${label}=; ${demand.whenMissing}`);
    }
    return undefined;
  }
  const line = sheet.lineOf(label);
  const value = parseNumber(written);
  if (value === undefined) {
    const detail = `##${label}= holds "${written.slice(0, 40)}", which is not a number`;
    faults.add('unreadable-number', detail, { line });
    return undefined;
  }
  if (isWithin(value, demand)) return value;
  faults.add('number-out-of-range', `expected ##${label}= ${describe(demand)}, got ${value}`, { line });
  return undefined;
}

function isWithin(value: number, demand: NumberDemand): boolean {
  const { min = -Infinity, max = Infinity, isMinExcluded = false, isInteger = false } = demand;
  if (isInteger && !Number.isInteger(value)) return false;
  return value <= max && (isMinExcluded ? value > min : value >= min);
}

function describe({ min, max, isMinExcluded, isInteger }: NumberDemand): string {
  const parts: string[] = isInteger === true ? ['a whole number'] : [];
  if (min !== undefined) parts.push(`${isMinExcluded === true ? '>' : '>='} ${min}`);
  if (max !== undefined) parts.push(`<= ${max}`);
  return parts.join(', ');
}
