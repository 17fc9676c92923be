import type { Conditions } from '@spinassay/contract';
import { readAffnNumber } from './affn-number.ts';
import type { FaultList } from './fault-list.ts';
import { readHeaderNumber } from './header-numbers.ts';
import type { RecordSheet } from './record-sheet.ts';

/** The conditions that a file can state without room for interpretation. */
export type FileConditions = Pick<
  Conditions,
  | 'referenceFrequencyMHz'
  | 'carrierPpm'
  | 'spectralWidthHz'
  | 'timeZeroSampleIndex'
  | 'temperatureCelsius'
  | 'solvent'
  | 'recycleDelaySeconds'
  | 'acquisitionTimeSeconds'
  | 'scanCount'
>;

const KELVIN_AT_ZERO_CELSIUS = 273.15;
/** The contract's longest label. */
const SOLVENT_LENGTH_MAX = 200;
const OBSERVE_FREQUENCY_MAX_MHZ = 2_500;

/**
 * Read the conditions that a file declares. The labels beginning with `$` are private ones that this house
 * documents (README); the rest are the standard's. The pulse sequence is free text and never interpreted, so
 * the sequence of a bare file stays undeclared.
 */
export function readDeclaredConditions(sheet: RecordSheet, faults: FaultList): FileConditions {
  const number = (label: string, min?: number, max?: number): number | undefined =>
    readHeaderNumber(
      sheet,
      label,
      { ...(min === undefined ? {} : { min }), ...(max === undefined ? {} : { max }) },
      faults,
    );
  const positive = (label: string, max = Number.MAX_VALUE): number | undefined =>
    readHeaderNumber(sheet, label, { min: 0, isMinExcluded: true, max }, faults);
  return withoutUndefined({
    referenceFrequencyMHz: positive('$REFERENCE FREQUENCY MHZ', OBSERVE_FREQUENCY_MAX_MHZ),
    carrierPpm: number('$CARRIER PPM'),
    spectralWidthHz: positive('$SPECTRAL WIDTH HZ'),
    timeZeroSampleIndex: number('$TIME ZERO POINT'),
    temperatureCelsius: temperatureOf(sheet.textOf('TEMPERATURE')),
    solvent: sheet.textOf('.SOLVENT NAME')?.slice(0, SOLVENT_LENGTH_MAX),
    recycleDelaySeconds: number('$RECYCLE DELAY SECONDS', 0),
    acquisitionTimeSeconds: positive('.ACQUISITION TIME'),
    scanCount: readHeaderNumber(sheet, '.AVERAGES', { min: 1, isInteger: true }, faults),
  });
}

/** The standard's unit is the degree Celsius; K is taken where it is written. Anything else stays undeclared. */
function temperatureOf(written: string | undefined): number | undefined {
  if (written === undefined) return undefined;
  const cursor = { text: written, position: 0 };
  const value = readAffnNumber(cursor, written.length, 'affn');
  if (!Number.isFinite(value)) return undefined;
  const unit = written.slice(cursor.position).trim().toUpperCase();
  if (unit === '' || unit === 'C') return value;
  return unit === 'K' ? value - KELVIN_AT_ZERO_CELSIUS : undefined;
}

function withoutUndefined<Shape extends Record<string, unknown>>(
  fields: Shape,
): { [Key in keyof Shape]?: Exclude<Shape[Key], undefined> } {
  const given = Object.entries(fields).filter(([, value]) => value !== undefined);
  return Object.fromEntries(given) as { [Key in keyof Shape]?: Exclude<Shape[Key], undefined> };
}
