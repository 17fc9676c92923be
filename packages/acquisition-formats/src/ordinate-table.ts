import type { ExponentRule } from './affn-number.ts';
import { asdfDigits, characterKinds } from './asdf-digits.ts';
import { isCommentAt } from './labelled-records.ts';

/** Where a table stands in its text, and how it is to be read. */
export type OrdinateTable = {
  readonly text: string;
  readonly start: number;
  readonly end: number;
  /** 1-based line of the file that `start` is on. */
  readonly line: number;
  /** True where VAR_FORM declares the ordinates as AFFN: then an exponent needs no sign. */
  readonly isAffn: boolean;
};

/**
 * How `E` is read in a table: as an exponent or as the SQZ digit 5. Compressed digits besides E and e, which
 * begin exponents too, decide. One pass over the table.
 */
export function exponentRule({ text, start, end, isAffn }: OrdinateTable): ExponentRule {
  if (isAffn) return 'affn';
  let isInComment = false;
  for (let index = start; index < end; index += 1) {
    const code = text.charCodeAt(index);
    if (code === 10 || code === 13) isInComment = false;
    else if (isCommentAt(text, index)) isInComment = true;
    if (!isInComment && isCompressedDigit(code) && (code | 32) !== 101) return 'signed-after-point';
  }
  return 'signed';
}

function isCompressedDigit(code: number): boolean {
  const kind = asdfDigits.kindOf[code];
  const { squeezed, difference, repeat } = characterKinds;
  return kind === squeezed || kind === difference || kind === repeat;
}
