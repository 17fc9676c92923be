import type { FileConditions } from './declared-conditions.ts';
import type { FaultList } from './fault-list.ts';
import type { RecordSheet } from './record-sheet.ts';
import { SCALE_TOLERANCE, type TimeAxis } from './time-axis.ts';

/** What a file says of time and frequency, in several places. */
export type StatedScales = {
  readonly axis: TimeAxis;
  readonly observeFrequencyMHz: number | undefined;
  readonly declared: FileConditions;
};

/** Largest difference between a printed carrier and the one computed from two frequencies: eight digits of 500 MHz. */
const CARRIER_TOLERANCE_PPM = 0.02;
/** Largest difference between two statements of time zero, in samples. */
const TIME_ZERO_TOLERANCE_SAMPLES = 0.01;

/** Compare what a file says twice. A file that contradicts itself is refused: which half is right is unknown. */
export function checkScales(stated: StatedScales, sheet: RecordSheet, faults: FaultList): void {
  checkSpectralWidth(stated, sheet, faults);
  checkCarrier(stated, sheet, faults);
  checkTimeZero(stated, sheet, faults);
}

/** The spectral width of a complex signal is one over its dwell time. */
function checkSpectralWidth({ axis, declared }: StatedScales, sheet: RecordSheet, faults: FaultList): void {
  const width = declared.spectralWidthHz;
  if (width === undefined || Math.abs(width * axis.dwellSeconds - 1) <= SCALE_TOLERANCE) return;
  const detail = `the time axis means a spectral width of ${1 / axis.dwellSeconds} Hz, the label says ${width} Hz`;
  faults.add('dwell-disagrees', detail, { line: sheet.lineOf('$SPECTRAL WIDTH HZ') });
}

/** carrier in ppm = (observe frequency - reference frequency) / reference frequency */
function checkCarrier({ observeFrequencyMHz, declared }: StatedScales, sheet: RecordSheet, faults: FaultList): void {
  const { carrierPpm, referenceFrequencyMHz } = declared;
  if (carrierPpm === undefined || referenceFrequencyMHz === undefined || observeFrequencyMHz === undefined) return;
  const computedPpm = (1e6 * (observeFrequencyMHz - referenceFrequencyMHz)) / referenceFrequencyMHz;
  if (Math.abs(computedPpm - carrierPpm) <= CARRIER_TOLERANCE_PPM) return;
  const detail = `observe and reference frequency put the carrier at ${computedPpm} ppm, the label says ${carrierPpm} ppm`;
  faults.add('carrier-disagrees', detail, { line: sheet.lineOf('$CARRIER PPM') });
}

/** Time zero lies where the axis is zero; an axis that begins at zero says nothing of filter delays. */
function checkTimeZero({ axis, declared }: StatedScales, sheet: RecordSheet, faults: FaultList): void {
  const labelled = declared.timeZeroSampleIndex;
  if (labelled === undefined || axis.firstSeconds === 0) return;
  const onAxis = -axis.firstSeconds / axis.dwellSeconds;
  if (Math.abs(onAxis - labelled) <= TIME_ZERO_TOLERANCE_SAMPLES) return;
  const detail = `the time axis is zero at sample ${onAxis}, the label says ${labelled}`;
  faults.add('time-zero-disagrees', detail, { line: sheet.lineOf('$TIME ZERO POINT') });
}
