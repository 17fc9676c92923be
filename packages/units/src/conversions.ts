import {
  type Hertz,
  hertz,
  type Megahertz,
  type PartsPerMillion,
  type PerSecond,
  partsPerMillion,
  perSecond,
} from './quantities.ts';

/**
 * Frequency from the carrier of a shift: delta = (nu - nu_ref) / nu_ref.
 *
 * @param referenceFrequency absolute frequency of 0 ppm; its MHz are Hz per ppm
 * @source Harris et al., Pure Appl. Chem. 80 (2008) 59
 */
export function hertzFromShift(shift: PartsPerMillion, carrier: PartsPerMillion, referenceFrequency: Megahertz): Hertz {
  return hertz((shift - carrier) * referenceFrequency);
}

/** Shift of a frequency from the carrier; the inverse of hertzFromShift. */
export function shiftFromHertz(
  frequency: Hertz,
  carrier: PartsPerMillion,
  referenceFrequency: Megahertz,
): PartsPerMillion {
  return partsPerMillion(carrier + frequency / referenceFrequency);
}

/** Decay rate of a line of full width at half maximum w: R = pi w. */
export function decayFromLinewidth(linewidth: Hertz): PerSecond {
  return perSecond(Math.PI * linewidth);
}

/** Full width at half maximum of a line that decays at rate R. */
export function linewidthFromDecay(decay: PerSecond): Hertz {
  return hertz(decay / Math.PI);
}
