import type { FaultList } from './fault-list.ts';
import { readHeaderNumber } from './header-numbers.ts';
import type { RecordSheet } from './record-sheet.ts';

/** Above the strongest magnets in sight, as in the contract. */
const OBSERVE_FREQUENCY_MAX_MHZ = 2_500;

/** Check nucleus and acquisition mode, and read the observe frequency: without these, samples are only numbers. */
export function readHeader(
  sheet: RecordSheet,
  faults: FaultList,
): { readonly observeFrequencyMHz: number | undefined } {
  checkNucleus(sheet, faults);
  checkAcquisitionMode(sheet, faults);
  const demand = {
    min: 0,
    isMinExcluded: true,
    max: OBSERVE_FREQUENCY_MAX_MHZ,
    whenMissing: 'give the observe frequency (the carrier) in MHz',
  };
  return { observeFrequencyMHz: readHeaderNumber(sheet, '.OBSERVE FREQUENCY', demand, faults) };
}

function checkNucleus(sheet: RecordSheet, faults: FaultList): void {
  const label = '.OBSERVE NUCLEUS';
  const nucleus = sheet.textOf(label);
  if (nucleus === undefined) {
    faults.add('missing-label', `the file has no ##${label}=; proton acquisitions say ^1H`);
  } else if (!['^1H', '1H'].includes(nucleus.toUpperCase())) {
    const detail = `the observed nucleus is "${nucleus.slice(0, 20)}"; only ^1H is analysed`;
    faults.add('wrong-nucleus', detail, { line: sheet.lineOf(label) });
  }
}

/** In a sequential acquisition the components are half a dwell time apart; read as simultaneous it would be wrong. */
function checkAcquisitionMode(sheet: RecordSheet, faults: FaultList): void {
  const label = '.ACQUISITION MODE';
  const mode = sheet.textOf(label);
  if (mode === undefined) {
    const detail = `the file has no ##${label}=; say SIMULTANEOUS where real and imaginary part are sampled together`;
    faults.add('missing-label', detail);
  } else if (mode.toUpperCase() !== 'SIMULTANEOUS') {
    const detail = `the acquisition mode is "${mode.slice(0, 20)}"; only SIMULTANEOUS is taken`;
    faults.add('unsupported-acquisition-mode', detail, { line: sheet.lineOf(label) });
  }
}
