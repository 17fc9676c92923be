import { DimensionError, DomainError } from '@spinassay/numerics';

/** What is coupled to what, without the values. Parameters may be shared: symmetry ties shifts and couplings. */
export interface SpinTopology {
  readonly spins: readonly {
    /** n magnetically equivalent protons act as one composite spin. */
    readonly protonCount: number;
    readonly groupIndex: number;
    readonly shiftIndex: number;
  }[];
  readonly groupCount: number;
  readonly shiftCount: number;
  readonly couplingCount: number;
  readonly couplings: readonly { readonly spinA: number; readonly spinB: number; readonly couplingIndex: number }[];
}

/** A connected component with more protons than the exact engine takes. */
export class SystemTooLargeError extends DomainError {
  override readonly name = 'SystemTooLargeError';
  readonly protonCount: number;
  readonly protonCountMax: number;
  constructor(protonCount: number, protonCountMax: number) {
    super(
      `expected at most ${protonCountMax} protons in one connected spin system, got ${protonCount}; leave out couplings that this spectrum cannot show, or give magnetically equivalent protons as one spin`,
      { protonCount, protonCountMax },
    );
    this.protonCount = protonCount;
    this.protonCountMax = protonCountMax;
  }
}

/** Throws DomainError or DimensionError for counts and indices that make no system. */
export function checkTopology(topology: SpinTopology): void {
  const { spins, couplings, groupCount, shiftCount, couplingCount } = topology;
  const isIndex = (value: number, count: number): boolean => Number.isInteger(value) && value >= 0 && value < count;
  if (spins.length === 0) throw new DimensionError('expected at least one spin');
  spins.forEach((spin, s) => {
    if (!Number.isInteger(spin.protonCount) || spin.protonCount < 1) {
      throw new DomainError(`expected protonCount >= 1 of spin ${s}, got ${spin.protonCount}`);
    }
    if (!isIndex(spin.groupIndex, groupCount) || !isIndex(spin.shiftIndex, shiftCount)) {
      throw new DimensionError(`expected group and shift of spin ${s} to exist`);
    }
  });
  couplings.forEach(({ spinA, spinB, couplingIndex }, c) => {
    if (!isIndex(spinA, spins.length) || !isIndex(spinB, spins.length) || spinA === spinB) {
      throw new DimensionError(`expected coupling ${c} between two different spins, got ${spinA} and ${spinB}`);
    }
    if (!isIndex(couplingIndex, couplingCount))
      throw new DimensionError(`expected parameter of coupling ${c} to exist`);
  });
}

/** Spins of each connected component of the coupling graph, in rising order. */
export function connectedComponents({ spins, couplings }: SpinTopology): number[][] {
  const component = spins.map((_, s) => s);
  for (let changed = true; changed; ) {
    changed = false;
    for (const { spinA, spinB } of couplings) {
      const least = Math.min(component[spinA], component[spinB]);
      if (component[spinA] !== least || component[spinB] !== least) changed = true;
      component[spinA] = least;
      component[spinB] = least;
    }
  }
  return [...new Set(component)].map((root) => component.flatMap((c, s) => (c === root ? [s] : [])));
}
