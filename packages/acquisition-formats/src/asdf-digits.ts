/** What a character of an ordinate table begins. */
export const characterKinds = {
  invalid: 0,
  separator: 1,
  number: 2,
  squeezed: 3,
  difference: 4,
  repeat: 5,
  unknown: 6,
};

/**
 * Kind and digit of each ASCII character in compressed (ASDF) ordinates:
 * SQZ `@ A-I` = 0..9, `a-i` = -1..-9; DIF `% J-R` = 0..9, `j-r` = -1..-9; DUP `S-Z s` = 1..9.
 *
 * @source McDonald & Wilks, Appl. Spectrosc. 42 (1988) 151, table of the ASDF forms (from memory)
 */
export const asdfDigits = buildTables();

function buildTables(): { readonly kindOf: Uint8Array; readonly digitOf: Int8Array } {
  const kindOf = new Uint8Array(128);
  const digitOf = new Int8Array(128);
  const assign = (characters: string, kind: number, firstDigit: number, step: number): void => {
    for (let index = 0; index < characters.length; index += 1) {
      const code = characters.charCodeAt(index);
      kindOf[code] = kind;
      digitOf[code] = firstDigit + index * step;
    }
  };
  const { separator, number, squeezed, difference, repeat, unknown } = characterKinds;
  for (let code = 0; code <= 32; code += 1) kindOf[code] = separator;
  assign(',;', separator, 0, 0);
  assign('+-.0123456789', number, 0, 0);
  assign('@ABCDEFGHI', squeezed, 0, 1);
  assign('abcdefghi', squeezed, -1, -1);
  assign('%JKLMNOPQR', difference, 0, 1);
  assign('jklmnopqr', difference, -1, -1);
  assign('STUVWXYZs', repeat, 1, 1);
  assign('?', unknown, 0, 0);
  return { kindOf, digitOf };
}
