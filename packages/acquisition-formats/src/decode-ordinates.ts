import { type Cursor, type ExponentRule, isDigit, readAffnNumber } from './affn-number.ts';
import { asdfDigits, characterKinds } from './asdf-digits.ts';
import type { FaultCode, FaultList } from './fault-list.ts';
import { afterLineBreak, endOfLine, isCommentAt } from './labelled-records.ts';
import { exponentRule, type OrdinateTable } from './ordinate-table.ts';

const LONGEST_WORD = 'infinity'.length;

/** Told the abscissa of each line, the index of its first ordinate, and whether that one repeats the line above. */
export type AbscissaCheck = (abscissa: number, index: number, line: number, isAfterCheck: boolean) => void;

/**
 * Decode an (X++(Y..Y)) table in AFFN, PAC, SQZ, DIF and DUP forms, and mixtures of them, into `ordinates`.
 * Each line begins with an abscissa in AFFN. A line after one that ended in a difference repeats the last
 * ordinate, which is compared (Y-check) and not stored again. A faulty line is left; reading goes on behind it.
 *
 * @param ordinates (as many as expected) filled from 0, as written: FACTOR is the caller's to apply
 * @returns the number of ordinates stored; one too many is the fault `too-many-ordinates`
 * @cost O(characters + ordinates): repeats cannot pass the end of `ordinates`
 * @source McDonald & Wilks, Appl. Spectrosc. 42 (1988) 151; Davies & Lampen, Appl. Spectrosc. 47 (1993) 1093
 */
export function decodeOrdinatesInto(
  table: OrdinateTable,
  ordinates: Float64Array,
  checkAbscissa: AbscissaCheck,
  faults: FaultList,
): number {
  const { text, end, start } = table;
  const exponents = exponentRule(table);
  const decoder: Decoder = { text, position: start, ordinates, count: 0, exponents, ...nothingBefore };
  let line = table.line;
  while (decoder.position < end) {
    const lineEnd = Math.min(endOfLine(text, decoder.position), end);
    const fault = decodeLine(decoder, startOfComment(decoder, lineEnd), checkAbscissa, line);
    if (fault !== undefined) faults.add(fault, faultDetails[fault], { line });
    if (fault === 'too-many-ordinates') break;
    decoder.position = afterLineBreak(text, lineEnd);
    line += 1;
  }
  return decoder.count;
}

type Decoder = Cursor & {
  readonly ordinates: Float64Array;
  readonly exponents: ExponentRule;
  count: number;
  /** The last ordinate, NaN before the first. */
  last: number;
  /** The last difference, and whether the last ordinate was one: a repeat repeats it. */
  step: number;
  isDifference: boolean;
};

const nothingBefore = { last: Number.NaN, step: 0, isDifference: false };

const faultDetails = {
  'unreadable-abscissa': 'expected the line to begin with its abscissa as a plain number',
  'unreadable-ordinate': 'expected ordinates as numbers or in compressed digits; the rest of the line was left out',
  'missing-ordinate': 'an ordinate is given as unknown (? or NaN); a FID with missing points is not taken',
  'difference-without-start': 'the line begins with a difference; its first ordinate must be a value',
  'repeat-without-start': 'the line begins with a repeat count; its first ordinate must be a value',
  'too-many-ordinates': 'the table holds more ordinates than VAR_DIM says; reading stopped here',
  'y-check-failed':
    'the first ordinate must repeat the last of the line above, and does not: a line is damaged or lost',
} satisfies Partial<Record<FaultCode, string>>;

type LineFault = keyof typeof faultDetails;

/** Decode one line. Returns its fault, if any; a failed Y-check lets the line be read to its end. */
function decodeLine(
  decoder: Decoder,
  lineEnd: number,
  checkAbscissa: AbscissaCheck,
  line: number,
): LineFault | undefined {
  skipSeparators(decoder, lineEnd);
  if (decoder.position === lineEnd) return undefined;
  const abscissa = readAffnNumber(decoder, lineEnd, decoder.exponents);
  if (!Number.isFinite(abscissa)) return 'unreadable-abscissa';
  const isCheckDue = decoder.isDifference;
  checkAbscissa(abscissa, isCheckDue ? decoder.count - 1 : decoder.count, line, isCheckDue);
  let failedCheck: LineFault | undefined;
  let tokenIndex = 0;
  skipSeparators(decoder, lineEnd);
  while (decoder.position < lineEnd) {
    const before = decoder.last;
    const isCheck = isCheckDue && tokenIndex === 0;
    const fault = decodeToken(decoder, lineEnd, tokenIndex === 0, isCheck);
    if (fault !== undefined) return fault;
    if (isCheck && decoder.last !== before) failedCheck = 'y-check-failed';
    tokenIndex += 1;
    skipSeparators(decoder, lineEnd);
  }
  return failedCheck;
}

/** Decode one value, difference or repeat. The check of a line is compared by the caller, not stored. */
function decodeToken(decoder: Decoder, end: number, isFirst: boolean, isCheck: boolean): LineFault | undefined {
  const code = decoder.text.charCodeAt(decoder.position);
  const kind = code < 128 ? asdfDigits.kindOf[code] : characterKinds.invalid;
  if (kind === characterKinds.number) {
    return takeValue(decoder, readAffnNumber(decoder, end, decoder.exponents), isCheck);
  }
  if (kind === characterKinds.unknown || isSpelledOut(decoder, end)) return 'missing-ordinate';
  if (kind === characterKinds.squeezed) return takeValue(decoder, readCompressed(decoder, end), isCheck);
  if (kind === characterKinds.difference) {
    return isFirst ? 'difference-without-start' : takeDifference(decoder, readCompressed(decoder, end));
  }
  if (kind === characterKinds.repeat) {
    return isFirst ? 'repeat-without-start' : repeatLast(decoder, readCompressed(decoder, end));
  }
  return 'unreadable-ordinate';
}

function takeValue(decoder: Decoder, value: number, isCheck: boolean): LineFault | undefined {
  if (!Number.isFinite(value)) return 'unreadable-ordinate';
  decoder.last = value;
  decoder.isDifference = false;
  return isCheck ? undefined : store(decoder, value);
}

function takeDifference(decoder: Decoder, step: number): LineFault | undefined {
  const value = decoder.last + step;
  if (!Number.isFinite(value)) return 'unreadable-ordinate';
  decoder.last = value;
  decoder.step = step;
  decoder.isDifference = true;
  return store(decoder, value);
}

/** A repeat count includes the ordinate before it. After a difference, the difference is what is repeated. */
function repeatLast(decoder: Decoder, count: number): LineFault | undefined {
  if (!(count >= 1)) return 'unreadable-ordinate';
  const step = decoder.isDifference ? decoder.step : 0;
  for (let repeat = 1; repeat < count; repeat += 1) {
    decoder.last += step;
    const fault = store(decoder, decoder.last);
    if (fault !== undefined) return fault;
  }
  return undefined;
}

function store(decoder: Decoder, value: number): LineFault | undefined {
  if (decoder.count === decoder.ordinates.length) return 'too-many-ordinates';
  decoder.ordinates[decoder.count] = value;
  decoder.count += 1;
  return undefined;
}

/** A compressed digit and the plain digits behind it: `b05` is -205. NaN when a fraction follows: ASDF is integer. */
function readCompressed(decoder: Decoder, end: number): number {
  const { text } = decoder;
  const first = asdfDigits.digitOf[text.charCodeAt(decoder.position)] ?? Number.NaN;
  let magnitude = Math.abs(first);
  let index = decoder.position + 1;
  for (; index < end && isDigit(text.charCodeAt(index)); index += 1) {
    magnitude = magnitude * 10 + (text.charCodeAt(index) - 48);
  }
  decoder.position = index;
  if (index < end && text[index] === '.') return Number.NaN;
  return first < 0 ? -magnitude : magnitude;
}

/** NaN, Inf and Infinity as words of their own. Letters among digits are compressed ordinates. */
function isSpelledOut({ text, position }: Decoder, end: number): boolean {
  if (asdfDigits.kindOf[text.charCodeAt(position - 1)] !== characterKinds.separator) return false;
  const word = text.slice(position, Math.min(position + LONGEST_WORD + 1, end));
  return /^(nan|inf|infinity)(?![^\s,;])/i.test(word);
}

function skipSeparators(decoder: Decoder, end: number): void {
  const { text } = decoder;
  let index = decoder.position;
  while (index < end && asdfDigits.kindOf[text.charCodeAt(index)] === characterKinds.separator) index += 1;
  decoder.position = index;
}

function startOfComment({ text, position }: Decoder, lineEnd: number): number {
  for (let index = position; index + 1 < lineEnd; index += 1) {
    if (isCommentAt(text, index)) return index;
  }
  return lineEnd;
}
