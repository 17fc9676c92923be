import { type Celsius, type PartsPerMillion, partsPerMillion } from './quantities.ts';

/** The substance whose main singlet is 0 ppm. */
export type ShiftScale = 'DSS' | 'TSP' | 'TMS';

/** TSP carries a carboxylate: its zero moves by this much on the DSS scale when it loses its proton, pK 5.0. */
const TSP_SHIFT_PPM = -0.019;
const TSP_PK = 5.0;

/** What an undeclared pH is taken for: there TSP is all carboxylate. */
const PH_UNDECLARED = 7;

/**
 * A shift given on one scale, on another.
 *
 * delta(TSP, on the DSS scale) = -0.019 / (1 + 10^(5.0 - pH)) ppm. DSS and TMS are treated as one zero (about 0.017 ppm apart
 * in water; Harris 2008, weak).
 *
 * @source Wishart et al., J. Biomol. NMR 6 (1995) 135; De Marco, J. Magn. Reson. 26 (1977) 527
 */
export function convertShift(
  shift: PartsPerMillion,
  scales: { readonly from: ShiftScale; readonly to: ShiftScale },
  pH: number | undefined,
): PartsPerMillion {
  return partsPerMillion(shift + zeroOnDssScale(scales.from, pH) - zeroOnDssScale(scales.to, pH));
}

function zeroOnDssScale(scale: ShiftScale, pH: number | undefined): number {
  if (scale !== 'TSP') return 0;
  return TSP_SHIFT_PPM / (1 + Math.exp(Math.LN10 * (TSP_PK - (pH ?? PH_UNDECLARED))));
}

/**
 * Shift of residual water in D2O: 5.060 - 0.0122 T + 2.11e-5 T^2 ppm, published for 0 to 100 degrees; outside, the curve only runs on.
 *
 * @source Gottlieb, Kotlyar & Nudelman, J. Org. Chem. 62 (1997) 7512, eq. 1
 */
export function waterShift(temperature: Celsius): PartsPerMillion {
  return partsPerMillion(5.06 - 0.0122 * temperature + 2.11e-5 * temperature * temperature);
}
