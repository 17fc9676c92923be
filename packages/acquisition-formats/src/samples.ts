import type { FaultList } from './fault-list.ts';
import { findPages } from './find-pages.ts';
import { readComponent } from './read-component.ts';
import type { ReadingLimits } from './reading-limits.ts';
import type { RecordSheet } from './record-sheet.ts';
import { readTimeAxis, type TimeAxis } from './time-axis.ts';
import { readTupleVariables, type TupleVariable } from './tuple-variables.ts';

/** Interleaved re, im samples with their time axis; the axis is undefined where it was at fault. */
export type Samples = { readonly samples: Float64Array; readonly axis: TimeAxis | undefined };

/** Read both pages of an NTUPLES block. Undefined, with faults, when there are not two tables of one known length. */
export function readSamples(sheet: RecordSheet, limits: ReadingLimits, faults: FaultList): Samples | undefined {
  const variables = readTupleVariables(sheet, faults);
  const pages = findPages(sheet, faults);
  const [x, real, imaginary] = ['X', 'R', 'I'].map((symbol) => variables.get(symbol));
  if (x === undefined || real === undefined || imaginary === undefined) {
    if (variables.size > 0) {
      const detail = 'the variables of a FID are X, R and I; one of them is not in ##SYMBOL=';
      faults.add('missing-variable', detail, { line: sheet.lineOf('SYMBOL') });
    }
    return undefined;
  }
  if (!areFactorsSound([x, real, imaginary], sheet, faults)) return undefined;
  const sampleCount = readSampleCount([x, real, imaginary], sheet, limits, faults);
  if (sampleCount === undefined) return undefined;
  const axis = readTimeAxis(x, sampleCount, sheet, faults);
  const [realPage, imaginaryPage] = [pages.get('R'), pages.get('I')];
  if (realPage === undefined || imaginaryPage === undefined) return undefined;
  const shared = { x, axis, sampleCount };
  return {
    axis,
    samples: interleave(
      readComponent({ ...shared, page: realPage, variable: real }, faults),
      readComponent({ ...shared, page: imaginaryPage, variable: imaginary }, faults),
    ),
  };
}

function areFactorsSound(variables: readonly TupleVariable[], sheet: RecordSheet, faults: FaultList): boolean {
  const zeros = variables.filter(({ factor }) => factor === 0);
  for (const { symbol } of zeros) {
    faults.add('number-out-of-range', `##FACTOR= of ${symbol} is 0`, { line: sheet.lineOf('FACTOR') });
  }
  return zeros.length === 0;
}

/** The common VAR_DIM of the three variables; a missing one of X follows the components. */
function readSampleCount(
  [x, real, imaginary]: readonly [TupleVariable, TupleVariable, TupleVariable],
  sheet: RecordSheet,
  limits: ReadingLimits,
  faults: FaultList,
): number | undefined {
  const line = sheet.lineOf('VAR_DIM');
  const count = real.dimension;
  if (count === undefined) {
    faults.add('missing-label', 'the block has no ##VAR_DIM= for R; give the number of points of each variable');
    return undefined;
  }
  if (imaginary.dimension !== count || (x.dimension ?? count) !== count) {
    const detail = `##VAR_DIM= gives X ${x.dimension}, R ${count}, I ${imaginary.dimension}; expected one number`;
    faults.add('dimension-differs', detail, { line });
    return undefined;
  }
  if (Number.isInteger(count) && count >= limits.sampleCountMin && count <= limits.sampleCountMax) return count;
  const detail = `expected ${limits.sampleCountMin} to ${limits.sampleCountMax} points, got ${count}`;
  faults.add('sample-count-out-of-range', detail, { line });
  return undefined;
}

function interleave(real: Float64Array, imaginary: Float64Array): Float64Array {
  const samples = new Float64Array(2 * real.length);
  for (let index = 0; index < real.length; index += 1) {
    samples[2 * index] = real[index] ?? 0;
    samples[2 * index + 1] = imaginary[index] ?? 0;
  }
  return samples;
}
