import type { GeneratedIsotopologue } from './component-signal.ts';

/** A rare spin-1/2 isotope in one place of the molecule, and the protons it splits: 13C of a CH, 29Si of a Si(CH3)3. */
export interface GeneratedSatellite {
  /** Indices into the component's spins. */
  readonly spins: readonly number[];
  readonly couplingHz: number;
  /** Part of the molecules that hold the isotope in this place, 0 to 1. */
  readonly abundanceFraction: number;
  /** What the isotope moves these protons by; absent: nothing. */
  readonly isotopeShiftHz?: number;
}

/** One compound's connected spin system, rare isotopes included. */
export interface GeneratedComponent extends GeneratedIsotopologue {
  readonly satellites?: readonly GeneratedSatellite[];
}

/** Most satellites of a component: 3^3 copies of its protons. */
export const SATELLITE_COUNT_MAX = 3;

/**
 * The proton systems that a component is a mixture of. A partner S far away in frequency enters as J I_z S_z, so each of its two
 * states, equally full, moves its protons by +J/2 or -J/2; places are labelled independently, doubly labelled molecules included.
 *
 * @source heteronuclear secular coupling: Abragam, The Principles of Nuclear Magnetism (1961), ch. XI (from memory)
 */
export function isotopologuesOf({ satellites = [], ...protons }: GeneratedComponent): GeneratedIsotopologue[] {
  let copies: GeneratedIsotopologue[] = [protons];
  for (const satellite of satellites) copies = copies.flatMap((copy) => labelled(copy, satellite));
  return copies;
}

function labelled(copy: GeneratedIsotopologue, satellite: GeneratedSatellite): GeneratedIsotopologue[] {
  const { abundanceFraction, couplingHz, isotopeShiftHz = 0 } = satellite;
  const rest = { ...copy, amount: copy.amount * (1 - abundanceFraction) };
  const sides = [couplingHz / 2, -couplingHz / 2].map((splitHz) => ({
    ...copy,
    amount: (copy.amount * abundanceFraction) / 2,
    spins: copy.spins.map((spin, s) =>
      satellite.spins.includes(s) ? { ...spin, shiftHz: spin.shiftHz + isotopeShiftHz + splitHz } : spin,
    ),
  }));
  return abundanceFraction === 1 ? sides : [rest, ...sides];
}
