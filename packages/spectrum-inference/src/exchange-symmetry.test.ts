import { describe, expect, it } from 'vitest';
import { chainSystem, threeMethylenes } from '../test-support/example-systems.ts';
import { exchangeSymmetries } from './exchange-symmetry.ts';

describe('exchangeSymmetries', () => {
  it("finds that J and J' of each CH2-CH2 pair may change places on their own", () => {
    expect(exchangeSymmetries(threeMethylenes())).toEqual([[{ first: 0, second: 1 }], [{ first: 2, second: 3 }]]);
  });

  it('finds nothing to exchange where every proton has its own shift', () => {
    expect(
      exchangeSymmetries(
        chainSystem(
          [1, 2, 3],
          [
            [0, 1, 7],
            [1, 2, 7],
          ],
        ),
      ),
    ).toEqual([]);
  });

  it('leaves couplings alone whose partner would be missing', () => {
    const system = threeMethylenes();
    const lame = { ...system, couplings: system.couplings.filter((coupling) => coupling.label !== "J'(M,X)") };
    expect(exchangeSymmetries(lame)).toEqual([[{ first: 0, second: 1 }]]);
  });
});
