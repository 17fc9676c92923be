export { decayFromLinewidth, hertzFromShift, linewidthFromDecay, shiftFromHertz } from './conversions.ts';
export {
  type Celsius,
  celsius,
  type Hertz,
  hertz,
  type Megahertz,
  megahertz,
  type PartsPerMillion,
  type PerSecond,
  partsPerMillion,
  perSecond,
  type Seconds,
  seconds,
  UnitError,
} from './quantities.ts';
export { convertShift, type ShiftScale, waterShift } from './shift-scales.ts';
