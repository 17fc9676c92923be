import { SHIELDED_PROTON_MEGAHERTZ_PER_TESLA } from './physical-constants.ts';
import { type Megahertz, megahertz, type Tesla, tesla } from './quantities.ts';

/** Frequency of water protons (a sphere, 25 degrees) in a field. A magnet's label is rounded: this says which class it is, not where 0 ppm lies. */
export function protonFrequencyFromField(field: Tesla): Megahertz {
  return megahertz(SHIELDED_PROTON_MEGAHERTZ_PER_TESLA * field);
}

/** The field in which water protons have a frequency; the inverse of protonFrequencyFromField. */
export function fieldFromProtonFrequency(frequency: Megahertz): Tesla {
  return tesla(frequency / SHIELDED_PROTON_MEGAHERTZ_PER_TESLA);
}

/**
 * Absolute frequency of 0 ppm of another nucleus, from that of 1H in the same tube.
 *
 * @param protonZero     where the reference substance of the ratio has its protons
 * @param frequencyRatio one of FREQUENCY_RATIOS_TMS or FREQUENCY_RATIOS_DSS: the choice names the scale
 */
export function zeroFrequency(protonZero: Megahertz, frequencyRatio: number): Megahertz {
  return megahertz(protonZero * frequencyRatio);
}
