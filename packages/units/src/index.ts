export { decayFromLinewidth, hertzFromShift, linewidthFromDecay, shiftFromHertz } from './conversions.ts';
export { fieldFromProtonFrequency, protonFrequencyFromField, zeroFrequency } from './field.ts';
export {
  FREQUENCY_RATIOS_DSS,
  FREQUENCY_RATIOS_TMS,
  type FrequencyRatios,
  SHIELDED_PROTON_MEGAHERTZ_PER_TESLA,
} from './physical-constants.ts';
export {
  type Celsius,
  celsius,
  type Hertz,
  hertz,
  type Megahertz,
  type MillimolesPerLitre,
  megahertz,
  millimolesPerLitre,
  type PartsPerMillion,
  type PerSecond,
  partsPerMillion,
  perSecond,
  type Radians,
  radians,
  type Seconds,
  seconds,
  type Tesla,
  tesla,
  UnitError,
} from './quantities.ts';
export { convertShift, type ShiftScale, waterShift } from './shift-scales.ts';
