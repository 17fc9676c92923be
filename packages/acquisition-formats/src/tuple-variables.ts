import { parseNumber, printedHalfUnit } from './affn-number.ts';
import type { FaultList } from './fault-list.ts';
import type { RecordSheet } from './record-sheet.ts';

/** A number as printed in a file, with how far printing may have moved it. */
export type PrintedNumber = { readonly value: number; readonly halfUnit: number };

/** One variable of an NTUPLES block. Limits are in its unit, after FACTOR. */
export type TupleVariable = {
  readonly symbol: string;
  readonly form: string | undefined;
  readonly unit: string | undefined;
  readonly dimension: number | undefined;
  readonly first: PrintedNumber | undefined;
  readonly last: PrintedNumber | undefined;
  readonly min: PrintedNumber | undefined;
  readonly max: PrintedNumber | undefined;
  /** 1 where the file gives none. */
  readonly factor: number;
};

/**
 * Read the attribute lists of an NTUPLES block: each names one value a variable, in the order of SYMBOL.
 * Missing entries at the end of a list are absent; more entries than symbols are a fault.
 *
 * @returns the variables by symbol; empty, with a fault, when there is no SYMBOL
 * @source NTUPLES form: Davies & Lampen, Appl. Spectrosc. 47 (1993) 1093
 */
export function readTupleVariables(sheet: RecordSheet, faults: FaultList): ReadonlyMap<string, TupleVariable> {
  const symbols = entriesOf(sheet.textOf('SYMBOL')).map((symbol) => symbol.toUpperCase());
  if (symbols.length === 0) {
    faults.add('missing-label', 'the block has no ##SYMBOL=; write "X, R, I, N" as the standard asks for a FID');
    return new Map();
  }
  const listOf = (label: string): readonly string[] => {
    const entries = entriesOf(sheet.textOf(label));
    if (entries.length > symbols.length) {
      const detail = `##${label}= has ${entries.length} entries for ${symbols.length} symbols`;
      faults.add('too-many-entries', detail, { line: sheet.lineOf(label) });
    }
    return entries;
  };
  const numbersOf = (label: string): readonly (PrintedNumber | undefined)[] =>
    listOf(label).map((entry) => printedNumber(entry, label, sheet, faults));
  const [forms, units] = [listOf('VAR_FORM'), listOf('UNITS')];
  const [dimensions, factors] = [numbersOf('VAR_DIM'), numbersOf('FACTOR')];
  const [first, last, min, max] = [numbersOf('FIRST'), numbersOf('LAST'), numbersOf('MIN'), numbersOf('MAX')];
  return new Map(
    symbols.map((symbol, index) => [
      symbol,
      {
        symbol,
        form: textAt(forms, index),
        unit: textAt(units, index),
        dimension: dimensions[index]?.value,
        first: first[index],
        last: last[index],
        min: min[index],
        max: max[index],
        factor: factors[index]?.value ?? 1,
      },
    ]),
  );
}

/** Entries between commas, trimmed; an empty one at the very end is a comma too many and left out. */
function entriesOf(list: string | undefined): readonly string[] {
  if (list === undefined) return [];
  const entries = list.split(',').map((entry) => entry.trim());
  return entries[entries.length - 1] === '' ? entries.slice(0, -1) : entries;
}

function textAt(entries: readonly string[], index: number): string | undefined {
  const entry = entries[index];
  return entry === undefined || entry === '' ? undefined : entry.toUpperCase();
}

function printedNumber(entry: string, label: string, sheet: RecordSheet, faults: FaultList): PrintedNumber | undefined {
  if (entry === '') return undefined;
  const value = parseNumber(entry);
  if (value !== undefined) return { value, halfUnit: printedHalfUnit(entry) };
  const detail = `##${label}= holds "${entry.slice(0, 40)}", which is not a number`;
  faults.add('unreadable-number', detail, { line: sheet.lineOf(label) });
  return undefined;
}
