/** What is asked of one spectrum, in physics terms: the only way into this room. */

/** A normal prior; `sd` 0 fixes the value. */
export interface NormalPrior {
  readonly mean: number;
  readonly sd: number;
}

/** Protons that share one chemical shift, one response factor and one decay. */
export interface GroupQuestion {
  readonly label: string;
  /** On the scale of the reference, ppm. */
  readonly shiftPpm: NormalPrior;
  /** r_g: 1 for a 90 degree pulse with full recovery. */
  readonly responseFactor: NormalPrior;
  /** A spin of `protonCount` n stands for n magnetically equivalent protons. */
  readonly spins: readonly { readonly label: string; readonly protonCount: number }[];
}

/** One scalar coupling, acting on one or more pairs of spins (positions in the list of all spins of the system). */
export interface CouplingQuestion {
  readonly label: string;
  readonly couplingHz: NormalPrior;
  readonly pairs: readonly (readonly [number, number])[];
}

/** A rare spin-1/2 isotope coupled to one group: a share of the molecules shows the group split by the coupling. */
export interface SatelliteQuestion {
  readonly groupIndex: number;
  readonly couplingHz: number;
  readonly abundanceFraction: number;
}

export interface SpinSystemQuestion {
  readonly label: string;
  /** Identical copies of this system in one molecule. */
  readonly copyCount: number;
  readonly groups: readonly GroupQuestion[];
  readonly couplings: readonly CouplingQuestion[];
  readonly satellites: readonly SatelliteQuestion[];
}

export interface CompoundQuestion {
  readonly id: string;
  readonly spinSystems: readonly SpinSystemQuestion[];
}

export interface PpmRange {
  readonly lowPpm: number;
  readonly highPpm: number;
}

export interface WindowQuestion extends PpmRange {
  /** Complex Legendre terms; by default 3 and one more for each 0.1 ppm beyond the first 0.2. */
  readonly baselineTermCount?: number | undefined;
}

export interface SpectrumQuestion {
  /** Interleaved complex FID as measured. */
  readonly samples: Float64Array;
  readonly dwellSeconds: number;
  /** Carrier (0 Hz) on the declared ppm scale. */
  readonly carrierPpm: number;
  /** Hz per ppm: absolute frequency of 0 ppm, in MHz. */
  readonly hertzPerPpm: number;
  /** Fractional, 0-based index of the sample taken at time zero. */
  readonly timeZeroSamples: number;
  /** The compounds asked for. */
  readonly compounds: readonly CompoundQuestion[];
  /** The compound whose singlet is 0 ppm, searched for near 0; undefined where the tube holds none. */
  readonly reference: CompoundQuestion | undefined;
  /** Windows of the statistics; empty: made from the priors. */
  readonly windows: readonly WindowQuestion[];
  /** Solvent and other places that are nobody's to explain. */
  readonly excludedRegions: readonly PpmRange[];
  /** sd of one shift common to all analytes (pH, salt, temperature, a wrong reference). */
  readonly commonOffsetSdPpm: number;
  readonly seed: bigint;
}
