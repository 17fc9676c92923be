/** A place in a text that reading moves forward. */
export type Cursor = { readonly text: string; position: number };

/**
 * When `E` begins an exponent. In an AFFN table a digit may follow at once; elsewhere `E` is also the SQZ digit 5,
 * so that a sign must follow (same source), and in a table with other compressed digits a decimal point must precede.
 */
export type ExponentRule = 'affn' | 'signed' | 'signed-after-point';

/** Longest run of digits that is exact in a double when summed digit by digit. */
const EXACT_DIGIT_COUNT = 15;
const ZERO = 48;
const POINT = 46;

/**
 * Read one AFFN number (sign, digits, point, exponent) at the cursor and move behind it.
 * NaN, with the cursor where it was, when no number stands there; Infinity where it overflows.
 *
 * @param end index behind the last character that may be read
 * @cost O(length of the number)
 * @source JCAMP-DX 4.24, ASCII free format numeric: Appl. Spectrosc. 42 (1988) 151
 */
export function readAffnNumber(cursor: Cursor, end: number, exponents: ExponentRule): number {
  const { text, position: start } = cursor;
  const isSigned = isSign(text.charCodeAt(start));
  const wholeStart = isSigned ? start + 1 : start;
  const wholeEnd = skipDigits(text, wholeStart, end);
  const hasPoint = wholeEnd < end && text.charCodeAt(wholeEnd) === POINT;
  const mantissaEnd = hasPoint ? skipDigits(text, wholeEnd + 1, end) : wholeEnd;
  if (mantissaEnd - wholeStart - (hasPoint ? 1 : 0) === 0) return Number.NaN;
  const numberEnd = skipExponent(text, mantissaEnd, end, hasPoint, exponents);
  cursor.position = numberEnd;
  if (numberEnd > wholeEnd || wholeEnd - wholeStart > EXACT_DIGIT_COUNT) return Number(text.slice(start, numberEnd));
  const magnitude = digitsToInteger(text, wholeStart, wholeEnd);
  // 0 - x and not -x: a written -0 is the number 0.
  return isSigned && text[start] === '-' ? 0 - magnitude : magnitude;
}

/** Read a text that is one number and nothing else, exponents as in AFFN; undefined when it is not a finite one. */
export function parseNumber(text: string): number | undefined {
  const cursor = { text, position: 0 };
  const value = readAffnNumber(cursor, text.length, 'affn');
  return cursor.position === text.length && Number.isFinite(value) ? value : undefined;
}

/** Half a unit in the last printed place of a decimal number: how far printing may have moved it. */
export function printedHalfUnit(text: string): number {
  const [mantissa = '', exponent = '0'] = text.toUpperCase().split('E');
  const point = mantissa.indexOf('.');
  const decimals = point === -1 ? 0 : mantissa.length - point - 1;
  return 0.5 * Number(`1e${Number(exponent) - decimals}`);
}

function skipDigits(text: string, start: number, end: number): number {
  let index = start;
  while (index < end && isDigit(text.charCodeAt(index))) index += 1;
  return index;
}

function skipExponent(text: string, start: number, end: number, hasPoint: boolean, rule: ExponentRule): number {
  const letter = text[start];
  if (start >= end || (letter !== 'E' && letter !== 'e')) return start;
  const isSigned = isSign(text.charCodeAt(start + 1));
  const digits = isSigned ? start + 2 : start + 1;
  const isExponent = rule === 'affn' || (isSigned && (rule === 'signed' || hasPoint));
  const exponentEnd = isExponent ? skipDigits(text, digits, end) : start;
  return exponentEnd > digits ? exponentEnd : start;
}

/** @param end at most EXACT_DIGIT_COUNT digits behind `start` */
function digitsToInteger(text: string, start: number, end: number): number {
  let value = 0;
  for (let index = start; index < end; index += 1) value = value * 10 + (text.charCodeAt(index) - ZERO);
  return value;
}

export function isDigit(code: number): boolean {
  return code >= ZERO && code < ZERO + 10;
}

function isSign(code: number): boolean {
  return code === 43 || code === 45;
}
