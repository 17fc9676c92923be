import { parseNumber } from './affn-number.ts';
import { checkOrdinates } from './check-ordinates.ts';
import { type AbscissaCheck, decodeOrdinatesInto } from './decode-ordinates.ts';
import type { FaultList } from './fault-list.ts';
import type { Page } from './find-pages.ts';
import type { TimeAxis } from './time-axis.ts';
import type { TupleVariable } from './tuple-variables.ts';

/** What is needed to read one component of a FID. */
export type ComponentSource = {
  readonly page: Page;
  readonly variable: TupleVariable;
  readonly x: TupleVariable;
  /** Undefined when the axis is at fault: then abscissas are not checked. */
  readonly axis: TimeAxis | undefined;
  readonly sampleCount: number;
};

/** An abscissa may be off by less than half a sample, however it was printed. */
const ABSCISSA_TOLERANCE_SAMPLES = 0.5;

/**
 * Read the ordinates of one component, times their FACTOR, and check them against everything the file says of
 * them: their number, the abscissa of each line, FIRST, LAST, MIN and MAX.
 *
 * @returns (sampleCount) in the variable's unit; meaningless where faults were added
 */
export function readComponent(source: ComponentSource, faults: FaultList): Float64Array {
  const { page, variable, sampleCount } = source;
  const ordinates = new Float64Array(sampleCount);
  const table = { ...page.table, isAffn: variable.form === 'AFFN' };
  const count = decodeOrdinatesInto(table, ordinates, abscissaCheck(source, faults), faults);
  const line = page.table.line;
  const stated = page.pointCountText === undefined ? sampleCount : parseNumber(page.pointCountText);
  if (stated !== sampleCount) {
    const detail = `##NPOINTS= of ${variable.symbol} is "${page.pointCountText?.slice(0, 20)}", VAR_DIM is ${sampleCount}`;
    faults.add('dimension-differs', detail, { line });
  }
  if (count < sampleCount) {
    const detail = `the table of ${variable.symbol} holds ${count} ordinates, VAR_DIM is ${sampleCount}: a line is lost or cut off`;
    faults.add('ordinate-count-differs', detail, { line });
  }
  for (let index = 0; index < count; index += 1) ordinates[index] = (ordinates[index] ?? 0) * variable.factor;
  if (count === sampleCount) checkOrdinates(ordinates, variable, line, faults);
  return ordinates;
}

/** Compare the abscissa of a line with the place of its first ordinate. After a Y-check some writers count on by one. */
function abscissaCheck({ axis, x }: ComponentSource, faults: FaultList): AbscissaCheck {
  if (axis === undefined) return () => {};
  return (abscissa, index, line, isAfterCheck) => {
    const place = (abscissa * x.factor - axis.firstSeconds) / axis.dwellSeconds;
    if (Math.abs(place - index) < ABSCISSA_TOLERANCE_SAMPLES) return;
    if (isAfterCheck && Math.abs(place - index - 1) < ABSCISSA_TOLERANCE_SAMPLES) return;
    const detail = `the line's abscissa belongs to sample ${place}, its first ordinate is sample ${index}: a line is damaged or lost`;
    faults.add('x-check-failed', detail, { line });
  };
}
