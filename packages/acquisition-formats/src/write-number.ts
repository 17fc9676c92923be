/** The shortest decimal that reads back to the same double, its exponent with a sign as AFFN asks: 1E-7, 1E+21. */
export function writeNumber(value: number): string {
  return String(value === 0 ? 0 : value).replace('e', 'E');
}
