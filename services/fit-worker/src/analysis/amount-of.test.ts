import { describe, expect, it } from 'vitest';
import { reported } from './amount-of.ts';

describe('reported', () => {
  it('writes a mass standard as JCGM 100 does', () => {
    // JCGM 100:2008, 7.2.4: mS = (100,021 47 +- 0,000 79) g.
    expect(reported(100.0214701, 0.000791, 'g')).toBe('(100.02147 ± 0.00079) g');
  });

  // Rounding rule: U to two significant digits, the value to the same place (JCGM 100:2008, 7.2.6).
  it.each([
    [20.4567, 0.0996, '(20.46 ± 0.10) mmol/L'],
    [20.4567, 0.0994, '(20.457 ± 0.099) mmol/L'],
    [1234.5, 56, '(1235 ± 56) mmol/L'],
    [1234.5, 560, '(1230 ± 560) mmol/L'],
    [-0.123, 0.45, '(-0.12 ± 0.45) mmol/L'],
  ])('rounds %d with U = %d once', (value, expanded, expected) => {
    expect(reported(value, expanded, 'mmol/L')).toBe(expected);
  });
});
