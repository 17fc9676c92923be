import type { ReadAcquisition } from './read-acquisition.ts';
import { writeAffnLines } from './write-affn-lines.ts';
import { writeDifdupLines } from './write-difdup-lines.ts';
import { writeNumber } from './write-number.ts';

/** How ordinates are written: as plain numbers, or as differences with repeat counts (whole numbers only). */
export type OrdinateForm = 'affn' | 'difdup';

/** The signal cannot be written as asked. */
export class UnwritableAcquisitionError extends Error {
  override readonly name = 'UnwritableAcquisitionError';
}

/** Largest ordinate written as a difference: differences of two stay exact in a double. */
const ORDINATE_MAX = 2 ** 51;

/**
 * Write a signal as a JCAMP-DX 6 file that `readAcquisition` reads back to the same samples, scales and declared
 * conditions, bit for bit but for the sign of zero. Lines have at most 80 characters where the free text allows.
 *
 * @throws UnwritableAcquisitionError when a sample is not finite, or not whole for `difdup`
 * @source McDonald & Wilks, Appl. Spectrosc. 42 (1988) 151; Davies & Lampen, Appl. Spectrosc. 47 (1993) 1093
 */
export function writeAcquisition(acquisition: ReadAcquisition, form: OrdinateForm): string {
  const real = component(acquisition, 0, form);
  const imaginary = component(acquisition, 1, form);
  const lines = form === 'affn' ? writeAffnLines : writeDifdupLines;
  return [
    ...headerLines(acquisition),
    ...variableLines(acquisition, real, imaginary, form),
    '##PAGE= N=1',
    '##DATA TABLE= (X++(R..R)), XYDATA',
    ...lines(real),
    '##PAGE= N=2',
    '##DATA TABLE= (X++(I..I)), XYDATA',
    ...lines(imaginary),
    '##END NTUPLES= NMR FID',
    '##END=',
    '',
  ].join('\n');
}

/** Every second component, checked. @param first 0 for the real part, 1 for the imaginary */
function component({ samples, sampleCount }: ReadAcquisition, first: 0 | 1, form: OrdinateForm): Float64Array {
  const values = new Float64Array(sampleCount);
  for (let index = 0; index < sampleCount; index += 1) {
    const value = samples[2 * index + first] ?? Number.NaN;
    if (!Number.isFinite(value)) throw new UnwritableAcquisitionError(`sample ${index} is ${value}`);
    if (form === 'difdup' && !(Number.isInteger(value) && Math.abs(value) <= ORDINATE_MAX)) {
      throw new UnwritableAcquisitionError(`expected whole numbers for differences, sample ${index} is ${value}`);
    }
    values[index] = value;
  }
  return values;
}

function headerLines({ title, pulseSequenceText, declared, ...signal }: ReadAcquisition): string[] {
  const optional: readonly (readonly [string, string | number | undefined])[] = [
    ['.ACQUISITION TIME', declared.acquisitionTimeSeconds],
    ['.AVERAGES', declared.scanCount],
    ['.SOLVENT NAME', declared.solvent],
    ['TEMPERATURE', declared.temperatureCelsius],
    ['.PULSE SEQUENCE', pulseSequenceText],
    ['$REFERENCE FREQUENCY MHZ', declared.referenceFrequencyMHz],
    ['$CARRIER PPM', declared.carrierPpm],
    ['$RECYCLE DELAY SECONDS', declared.recycleDelaySeconds],
    ['$SPECTRAL WIDTH HZ', declared.spectralWidthHz],
    ['$TIME ZERO POINT', declared.timeZeroSampleIndex],
  ];
  return [
    `##TITLE= ${freeText(title ?? '')}`,
    '##JCAMP-DX= 6.0',
    '##DATA TYPE= NMR FID',
    '##DATA CLASS= NTUPLES',
    `##.OBSERVE FREQUENCY= ${writeNumber(signal.observeFrequencyMHz)}`,
    '##.OBSERVE NUCLEUS= ^1H',
    '##.ACQUISITION MODE= SIMULTANEOUS',
    ...optional.flatMap(([label, value]) => {
      if (value === undefined) return [];
      return [`##${label}= ${typeof value === 'number' ? writeNumber(value) : freeText(value)}`];
    }),
  ];
}

function variableLines(
  { sampleCount, dwellSeconds }: ReadAcquisition,
  real: Float64Array,
  imaginary: Float64Array,
  form: OrdinateForm,
): string[] {
  const ordinateForm = form === 'affn' ? 'AFFN' : 'ASDF';
  const last = sampleCount - 1;
  const row = (x: number, pick: (values: Float64Array) => number): string =>
    [x, pick(real), pick(imaginary)].map(writeNumber).join(', ');
  const extreme = (choose: (a: number, b: number) => number) => (values: Float64Array) => values.reduce(choose);
  return [
    '##NTUPLES= NMR FID',
    '##VAR_NAME= TIME, FID/REAL, FID/IMAG, PAGE NUMBER',
    '##SYMBOL= X, R, I, N',
    '##VAR_TYPE= INDEPENDENT, DEPENDENT, DEPENDENT, PAGE',
    `##VAR_FORM= AFFN, ${ordinateForm}, ${ordinateForm}, AFFN`,
    `##VAR_DIM= ${sampleCount}, ${sampleCount}, ${sampleCount}, 2`,
    '##UNITS= SECONDS, ARBITRARY UNITS, ARBITRARY UNITS,',
    `##FIRST= ${row(0, (values) => values[0] ?? 0)}, 1`,
    `##LAST= ${row(last * dwellSeconds, (values) => values[last] ?? 0)}, 2`,
    `##MIN= ${row(
      0,
      extreme((a, b) => Math.min(a, b)),
    )}, 1`,
    `##MAX= ${row(
      last * dwellSeconds,
      extreme((a, b) => Math.max(a, b)),
    )}, 2`,
    `##FACTOR= ${writeNumber(dwellSeconds)}, 1, 1, 1`,
  ];
}

/** Free text on one line, without what would begin a comment or a label. */
function freeText(text: string): string {
  return text
    .replace(/\s+/g, ' ')
    .replace(/\$(?=\$)/g, '$ ')
    .trim();
}
