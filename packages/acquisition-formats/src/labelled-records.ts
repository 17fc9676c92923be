import type { FaultList } from './fault-list.ts';
import type { ReadingLimits } from './reading-limits.ts';

/** One labelled data record: `##LABEL= value`, the value reaching to the next record. Ranges are of the text. */
export type LabelledRecord = {
  /** In the form in which labels are compared: see {@link comparableLabel}. */
  readonly label: string;
  readonly line: number;
  readonly valueStart: number;
  readonly valueEnd: number;
};

const LINE_FEED = 10;
const CARRIAGE_RETURN = 13;
const HASH = 35;
const DOLLAR = 36;
const EQUALS = 61;

/**
 * Cut a text into its labelled data records, in one pass. Lines end with LF, CR or CRLF.
 * A file without any record, or with text before the first, is reported as `not-jcamp-dx`.
 *
 * @source JCAMP-DX 4.24: McDonald & Wilks, Appl. Spectrosc. 42 (1988) 151, section on labelled data records
 */
export function splitLabelledRecords(text: string, limits: ReadingLimits, faults: FaultList): LabelledRecord[] {
  const records: LabelledRecord[] = [];
  let open: Omit<LabelledRecord, 'valueEnd'> | undefined;
  let line = 0;
  for (let start = 0; start < text.length; ) {
    line += 1;
    const end = endOfLine(text, start);
    if (end - start > limits.lineLengthMax) {
      faults.add('line-too-long', `the line has ${end - start} characters; at most ${limits.lineLengthMax}`, { line });
    }
    const first = skipBlanks(text, start, end);
    if (text.charCodeAt(first) === HASH && text.charCodeAt(first + 1) === HASH && first + 1 < end) {
      if (open !== undefined) records.push({ ...open, valueEnd: start });
      if (records.length >= limits.labelCountMax) {
        faults.add('too-many-labels', `the file has more than ${limits.labelCountMax} labels`, { line });
        return records;
      }
      open = openRecord(text, first, end, line, faults);
    } else if (open === undefined && first < end && !isCommentAt(text, first)) {
      faults.add('not-jcamp-dx', 'the file does not begin with a label such as ##TITLE=; is it JCAMP-DX?', { line });
      return records;
    }
    start = afterLineBreak(text, end);
  }
  if (open !== undefined) records.push({ ...open, valueEnd: text.length });
  return records;
}

function openRecord(text: string, first: number, end: number, line: number, faults: FaultList) {
  let equals = first;
  while (equals < end && text.charCodeAt(equals) !== EQUALS) equals += 1;
  if (equals === end) {
    faults.add('label-without-equals-sign', 'a line that begins with ## holds a label and an equals sign', { line });
    return { label: '', line, valueStart: end };
  }
  return { label: comparableLabel(text.slice(first + 2, equals)), line, valueStart: equals + 1 };
}

/** Labels are compared in upper case, without spaces, hyphens, slashes and underscores (same source). */
export function comparableLabel(written: string): string {
  let label = '';
  for (const character of written.toUpperCase()) {
    if (!' \t-/_'.includes(character)) label += character;
  }
  return label;
}

/** Index of the line break that ends the line at `start`, or the length of the text. */
export function endOfLine(text: string, start: number): number {
  let index = start;
  for (; index < text.length; index += 1) {
    const code = text.charCodeAt(index);
    if (code === LINE_FEED || code === CARRIAGE_RETURN) break;
  }
  return index;
}

/** Index of the first character after the line break at `end`. */
export function afterLineBreak(text: string, end: number): number {
  return text.charCodeAt(end) === CARRIAGE_RETURN && text.charCodeAt(end + 1) === LINE_FEED ? end + 2 : end + 1;
}

/** Index of the first character at or after `start` that is neither a blank nor a control character. */
export function skipBlanks(text: string, start: number, end: number): number {
  let index = start;
  while (index < end && text.charCodeAt(index) <= 32) index += 1;
  return index;
}

/** True where `$$` begins a comment. */
export function isCommentAt(text: string, index: number): boolean {
  return text.charCodeAt(index) === DOLLAR && text.charCodeAt(index + 1) === DOLLAR;
}
