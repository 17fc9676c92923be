import { readAffnNumber } from './affn-number.ts';
import type { FaultList } from './fault-list.ts';
import type { RecordSheet } from './record-sheet.ts';

/**
 * Check that a block is a one-dimensional NMR FID with a real and an imaginary component.
 *
 * @returns false, with its fault, when it is something else: then its other labels say nothing about a FID
 */
export function checkKind(sheet: RecordSheet, faults: FaultList): boolean {
  checkVersion(sheet, faults);
  return isFid(sheet, faults) && isComplex(sheet, faults) && isOneDimensional(sheet, faults);
}

function checkVersion(sheet: RecordSheet, faults: FaultList): void {
  const written = sheet.textOf('JCAMP-DX');
  if (written === undefined) {
    faults.add('missing-label', 'the file has no ##JCAMP-DX=; the version must be 5 or 6');
    return;
  }
  const version = Math.floor(readAffnNumber({ text: written, position: 0 }, written.length, 'affn'));
  if (version !== 5 && version !== 6) {
    const detail = `the version is "${written.slice(0, 40)}"; NMR files are taken in versions 5 and 6`;
    faults.add('unsupported-version', detail, { line: sheet.lineOf('JCAMP-DX') });
  }
}

function isFid(sheet: RecordSheet, faults: FaultList): boolean {
  const dataType = sheet.textOf('DATA TYPE')?.toUpperCase();
  const line = sheet.lineOf('DATA TYPE');
  if (dataType === undefined) {
    faults.add('missing-label', 'the file has no ##DATA TYPE=; a FID says NMR FID');
    return false;
  }
  const tuples = sheet.textOf('NTUPLES')?.toUpperCase() ?? dataType;
  if (dataType === 'NMR FID' && tuples === 'NMR FID') return true;
  const named = (dataType === 'NMR FID' ? tuples : dataType).slice(0, 40);
  if (named.startsWith('ND ')) {
    faults.add('not-one-dimensional', `the file holds "${named}"; only one-dimensional FIDs are taken`, { line });
  } else if (named === 'NMR SPECTRUM') {
    const detail = 'the file holds a processed spectrum; export the FID of the same acquisition and send that';
    faults.add('processed-spectrum', detail, { line });
  } else {
    faults.add('not-an-nmr-fid', `the file holds "${named}"; expected NMR FID`, { line });
  }
  return false;
}

function isComplex(sheet: RecordSheet, faults: FaultList): boolean {
  const dataClass = sheet.textOf('DATA CLASS')?.toUpperCase();
  if (dataClass === 'NTUPLES' || (dataClass === undefined && sheet.find('NTUPLES') !== undefined)) return true;
  if (dataClass === undefined && sheet.find('XYDATA') === undefined) {
    faults.add('missing-label', 'the file has no ##DATA CLASS=; a FID of two components says NTUPLES');
    return false;
  }
  const detail = 'the file holds one component only; export real and imaginary part (DATA CLASS NTUPLES)';
  faults.add('real-only', detail, { line: sheet.lineOf('DATA CLASS') });
  return false;
}

function isOneDimensional(sheet: RecordSheet, faults: FaultList): boolean {
  const dimensions = sheet.textOf('NUM DIM') ?? '1';
  const symbols = (sheet.textOf('SYMBOL') ?? '').split(',').map((symbol) => symbol.trim().toUpperCase());
  const foreign = symbols.find((symbol) => !['', 'X', 'R', 'I', 'N'].includes(symbol));
  if (dimensions === '1' && foreign === undefined) return true;
  const detail =
    foreign === undefined
      ? `the file says it has ${dimensions.slice(0, 10)} dimensions; only one-dimensional FIDs are taken`
      : `the variables of a one-dimensional FID are X, R, I and the page N; the file has "${foreign.slice(0, 10)}"`;
  faults.add('not-one-dimensional', detail, { line: sheet.lineOf('SYMBOL') });
  return false;
}
