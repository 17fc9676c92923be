/**
 * Gyromagnetic ratio over 2 pi of the proton in water (a sphere, 25 degrees), MHz/T: 42.57638543(17).
 *
 * @source CODATA 2022, shielded proton
 */
export const SHIELDED_PROTON_MEGAHERTZ_PER_TESLA = 42.57638543;

/** The zero of each nucleus over the zero of 1H at the same field; the reference substance stands beside each. */
export interface FrequencyRatios {
  readonly '2H': number;
  readonly '13C': number;
  readonly '15N': number;
  readonly '19F'?: number;
  readonly '31P': number;
}

/**
 * Ratios where 1H of TMS (under 1 % in CDCl3) is 1: TMS for 2H and 13C, nitromethane for 15N, CCl3F for 19F, 85 % phosphoric acid for 31P.
 *
 * @source Harris et al., Pure Appl. Chem. 73 (2001) 1795, tables 1 and 2; kept in Pure Appl. Chem. 80 (2008) 59
 */
export const FREQUENCY_RATIOS_TMS = {
  '2H': 0.15350609,
  '13C': 0.2514502,
  '15N': 0.10136767,
  '19F': 0.94094011,
  '31P': 0.40480742,
} as const satisfies FrequencyRatios;

/**
 * Ratios for water, where 1H of DSS is 1: DSS for 2H and 13C, liquid ammonia for 15N, trimethyl phosphate (10 % in water) for 31P.
 *
 * @source Wishart et al., J. Biomol. NMR 6 (1995) 135, table 4; Markley et al., Pure Appl. Chem. 70 (1998) 117 (2H and 31P from memory)
 */
export const FREQUENCY_RATIOS_DSS = {
  '2H': 0.153506088,
  '13C': 0.25144953,
  '15N': 0.101329118,
  '31P': 0.404808636,
} as const satisfies FrequencyRatios;
