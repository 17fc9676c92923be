import type { FaultList } from './fault-list.ts';
import { comparableLabel, endOfLine, isCommentAt, type LabelledRecord } from './labelled-records.ts';

/** The records of one block, looked up by label. */
export type RecordSheet = {
  readonly text: string;
  readonly records: readonly LabelledRecord[];
  /** The record of a label that may stand once. Two with different values are a fault; the first is taken. */
  find(label: string): LabelledRecord | undefined;
  /** Its value without comments, lines joined by line feeds, trimmed; undefined when absent or empty. */
  textOf(label: string): string | undefined;
  /** The line of the label, or of the block's first record where it is absent. */
  lineOf(label: string): number;
};

/** Lay the records of one block out for lookup. Labels are given as people write them. */
export function createRecordSheet(text: string, records: readonly LabelledRecord[], faults: FaultList): RecordSheet {
  const byLabel = new Map<string, LabelledRecord[]>();
  for (const record of records) {
    const same = byLabel.get(record.label);
    if (same === undefined) byLabel.set(record.label, [record]);
    else same.push(record);
  }
  const reported = new Set<string>();
  const find = (label: string): LabelledRecord | undefined => {
    const found = byLabel.get(comparableLabel(label)) ?? [];
    const [first, ...others] = found;
    if (first === undefined || others.length === 0 || reported.has(label)) return first;
    reported.add(label);
    const value = recordValue(text, first);
    const contrary = others.find((other) => recordValue(text, other) !== value);
    if (contrary !== undefined) {
      const detail = `##${label}= is given twice with different values (first on line ${first.line}); keep one`;
      faults.add('repeated-label', detail, { line: contrary.line });
    }
    return first;
  };
  const textOf = (label: string): string | undefined => {
    const record = find(label);
    const value = record === undefined ? '' : recordValue(text, record);
    return value === '' ? undefined : value;
  };
  return { text, records, find, textOf, lineOf: (label) => find(label)?.line ?? records[0]?.line ?? 1 };
}

/** The value of a record without `$$` comments, lines trimmed and joined by line feeds. */
export function recordValue(text: string, record: LabelledRecord): string {
  const lines: string[] = [];
  for (let start = record.valueStart; start < record.valueEnd; ) {
    const end = Math.min(endOfLine(text, start), record.valueEnd);
    lines.push(text.slice(start, startOfComment(text, start, end)).trim());
    start = end + 1;
  }
  return lines
    .filter((line) => line !== '')
    .join('\n')
    .trim();
}

function startOfComment(text: string, start: number, end: number): number {
  for (let index = start; index + 1 < end; index += 1) {
    if (isCommentAt(text, index)) return index;
  }
  return end;
}
