import type { GeneratedComponent } from '../isotopologues.ts';

/** A signal that no catalogue knows of: a singlet, or a doublet whose partner is not seen. */
export interface UnknownLine {
  /** Signal at time zero. */
  readonly amount: number;
  readonly shiftHz: number;
  /** Distance of the two lines; absent: one line. */
  readonly splittingHz?: number;
  /** A broad hump under the spectrum is a line of a large decay. */
  readonly decayPerSecond: number;
}

/** The line as a component, so that phase, shim and feedback meet it like all others. The unseen partner is a satellite of every molecule. */
export function unknownLineComponent({
  amount,
  shiftHz,
  splittingHz,
  decayPerSecond,
}: UnknownLine): GeneratedComponent {
  return {
    amount,
    spins: [{ shiftHz, group: 0 }],
    couplings: [],
    groups: [{ responseFactor: 1, decayPerSecond }],
    ...(splittingHz === undefined
      ? {}
      : { satellites: [{ spins: [0], couplingHz: splittingHz, abundanceFraction: 1 }] }),
  };
}
