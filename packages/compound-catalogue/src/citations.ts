/** The citation of parameters in water near pH 7.4, refined from measured spectra, with the data bank's entry. */
export function measuredParameters(bmrbEntry: string): string {
  return `Dashti et al., Anal. Chem. 89 (2017) 12201 and 90 (2018) 10646; BMRB ${bmrbEntry}`;
}

/** Zero is zero by definition. */
export const scaleDefinition = 'definition of the scale: Harris et al., Pure Appl. Chem. 80 (2008) 59 (from memory)';

/** Both satellites together carry the abundance; they stand at plus and minus half the coupling. */
export const siliconSource = '29Si abundance 4.67 %, |2J(Si,H)| about 6.6 Hz: common knowledge, from memory';

/** Of every molar mass; deuterium by its nuclide mass. */
export const atomicWeightsSource =
  'molar mass: conventional atomic weights, Prohaska et al., Pure Appl. Chem. 94 (2022) 573 (from memory)';

/** For CH2 groups whose published geminal coupling contradicts measured signals. */
export const geminalCouplingSource = 'geminal coupling of sp3 CH2 in an open chain, -13 Hz with sd 1.5 Hz: from memory';
