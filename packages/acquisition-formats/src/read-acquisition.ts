import { checkKind } from './check-kind.ts';
import { checkScales } from './check-scales.ts';
import { type FileConditions, readDeclaredConditions } from './declared-conditions.ts';
import { decodeText } from './decode-text.ts';
import { type Fault, FaultList } from './fault-list.ts';
import { firstBlock } from './first-block.ts';
import { readHeader } from './header.ts';
import { splitLabelledRecords } from './labelled-records.ts';
import { type ReadingLimits, readingLimits } from './reading-limits.ts';
import { createRecordSheet, type RecordSheet } from './record-sheet.ts';
import { readSamples } from './samples.ts';
import type { TimeAxis } from './time-axis.ts';

/**
 * One measured signal. Its spectrum is the FFT with exp(-2 pi i f t) of re + i im; a positive offset from the
 * carrier is a higher ppm. Sample i was taken i dwell times after sample 0.
 */
export type ReadAcquisition = {
  readonly kind: 'fid';
  readonly nucleus: '1H';
  /** Free text, shown and never interpreted. */
  readonly title?: string;
  readonly pulseSequenceText?: string;
  /** (2 sampleCount) interleaved re, im, in the file's unit after FACTOR */
  readonly samples: Float64Array;
  readonly sampleCount: number;
  readonly dwellSeconds: number;
  readonly observeFrequencyMHz: number;
  readonly declared: FileConditions;
};

/** A signal, or everything that keeps it from being read. */
export type Reading =
  | { readonly ok: true; readonly acquisition: ReadAcquisition }
  | { readonly ok: false; readonly faults: readonly Fault[] };

/** The contract's longest title. */
const TITLE_LENGTH_MAX = 500;

/**
 * Read a JCAMP-DX 5 or 6 file that holds one 1H FID of two components (DATA CLASS NTUPLES, ordinates in AFFN or
 * any ASDF form). Never throws on what a file holds: every fault is returned, with its line, all at once.
 *
 * @cost O(length of the file)
 * @source McDonald & Wilks, Appl. Spectrosc. 42 (1988) 151; Davies & Lampen, Appl. Spectrosc. 47 (1993) 1093
 */
export function readAcquisition(file: string | Uint8Array, limits: ReadingLimits = readingLimits): Reading {
  const faults = new FaultList(limits.faultCountMax);
  const acquisition = readFile(file, limits, faults);
  return acquisition !== undefined && faults.isEmpty
    ? { ok: true, acquisition }
    : { ok: false, faults: faults.toArray() };
}

/** Undefined only together with a fault. */
function readFile(file: string | Uint8Array, limits: ReadingLimits, faults: FaultList): ReadAcquisition | undefined {
  const text = decodeText(file, limits, faults);
  if (text === undefined) return undefined;
  const block = firstBlock(text, splitLabelledRecords(text, limits, faults), faults);
  if (block === undefined) return undefined;
  const sheet = createRecordSheet(text, block, faults);
  if (!checkKind(sheet, faults)) return undefined;
  const header = readHeader(sheet, faults);
  const declared = readDeclaredConditions(sheet, faults);
  const read = readSamples(sheet, limits, faults);
  if (read?.axis === undefined) return undefined;
  const { axis, samples } = read;
  checkScales({ axis, observeFrequencyMHz: header.observeFrequencyMHz, declared }, sheet, faults);
  if (header.observeFrequencyMHz === undefined) return undefined;
  return {
    kind: 'fid',
    nucleus: '1H',
    ...freeText(sheet),
    samples,
    sampleCount: samples.length / 2,
    dwellSeconds: axis.dwellSeconds,
    observeFrequencyMHz: header.observeFrequencyMHz,
    declared: withTimeZero(declared, axis),
  };
}

/** An axis that does not begin at zero says where time zero is, unless a label has said so. */
function withTimeZero(declared: FileConditions, axis: TimeAxis): FileConditions {
  if (declared.timeZeroSampleIndex !== undefined || axis.firstSeconds === 0) return declared;
  return { ...declared, timeZeroSampleIndex: -axis.firstSeconds / axis.dwellSeconds };
}

function freeText(sheet: RecordSheet): Pick<ReadAcquisition, 'title' | 'pulseSequenceText'> {
  const title = sheet.textOf('TITLE')?.slice(0, TITLE_LENGTH_MAX);
  const sequence = sheet.textOf('.PULSE SEQUENCE')?.slice(0, TITLE_LENGTH_MAX);
  return {
    ...(title === undefined ? {} : { title }),
    ...(sequence === undefined ? {} : { pulseSequenceText: sequence }),
  };
}
