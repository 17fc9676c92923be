import { exchangeSymmetries } from './exchange-symmetry.ts';
import type { ParameterLayout } from './parameter-layout.ts';

/**
 * Name exchangeable couplings in the order of their prior means, so that one explanation has one place.
 *
 * @returns a new vector; equal to the input where nothing is exchangeable
 */
export function canonicalOrder(layout: ParameterLayout, standardised: Float64Array): Float64Array {
  const ordered = standardised.slice();
  layout.compounds.forEach((compound, c) => {
    compound.spinSystems.forEach((system, s) => {
      const { coupling } = layout.places[c][s];
      const value = (j: number): number => {
        const { mean, unit } = layout.parameters[coupling + j];
        return mean + unit * ordered[coupling + j];
      };
      const put = (j: number, hz: number): void => {
        const { mean, unit } = layout.parameters[coupling + j];
        ordered[coupling + j] = unit > 0 ? (hz - mean) / unit : 0;
      };
      for (const pairs of exchangeSymmetries(system)) {
        const disorder = pairs.reduce((sum, { first, second }) => {
          const prior = system.couplings[second].couplingHz.mean - system.couplings[first].couplingHz.mean;
          return sum + (value(second) - value(first)) * (prior === 0 ? 1 : Math.sign(prior));
        }, 0);
        if (disorder >= 0) continue;
        for (const { first, second } of pairs) {
          const held = value(first);
          put(first, value(second));
          put(second, held);
        }
      }
    });
  });
  return ordered;
}
