import type { FaultList } from './fault-list.ts';
import type { RecordSheet } from './record-sheet.ts';
import type { TupleVariable } from './tuple-variables.ts';

/** When each sample was taken: sample i at firstSeconds + i dwellSeconds on the file's own axis. */
export type TimeAxis = { readonly firstSeconds: number; readonly dwellSeconds: number };

/** Agreement asked of two statements of one scale: printing with seven digits passes, another scale does not. */
export const SCALE_TOLERANCE = 2e-6;

const secondWords = ['SECONDS', 'SECOND', 'SEC', 'S'];

/**
 * The axis that the X variable of an NTUPLES block declares.
 *
 * FIRST and LAST define it. Where FACTOR times a whole number is the same step, that is taken instead: it is
 * printed with all its digits, LAST often is not. The same means within the printing of LAST and half a sample.
 *
 * @param sampleCount at least 2
 */
export function readTimeAxis(
  x: TupleVariable,
  sampleCount: number,
  sheet: RecordSheet,
  faults: FaultList,
): TimeAxis | undefined {
  if (x.unit === undefined || !secondWords.includes(x.unit)) {
    const detail = `expected the unit of X in ##UNITS= to be SECONDS, got ${x.unit?.slice(0, 40) ?? 'nothing'}`;
    faults.add('unsupported-time-unit', detail, { line: sheet.lineOf('UNITS') });
    return undefined;
  }
  if (x.first === undefined || x.last === undefined) {
    faults.add('missing-label', 'the time axis needs ##FIRST= and ##LAST= of X, and one of them is absent');
    return undefined;
  }
  const span = x.last.value - x.first.value;
  const printed = span / (sampleCount - 1);
  const exact = Math.round(printed / x.factor) * x.factor;
  const slack = Math.min(x.last.halfUnit, Math.abs(printed) / 2) + SCALE_TOLERANCE * Math.abs(span);
  const dwellSeconds = Math.abs(exact * (sampleCount - 1) - span) <= slack ? exact : printed;
  if (dwellSeconds > 0) return { firstSeconds: x.first.value, dwellSeconds };
  const detail = `expected time to grow from FIRST to LAST of X, got a dwell time of ${dwellSeconds} s`;
  faults.add('dwell-not-positive', detail, { line: sheet.lineOf('LAST') });
  return undefined;
}
