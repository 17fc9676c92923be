import type { Acquisition, AcquisitionPost } from '../acquisition.ts';

/** A small JCAMP-DX FID: one damped line at +200 Hz, 16 samples, computed for this example. */
export const jcampDxExample = [
  '##TITLE= invented FID of one line',
  '##JCAMP-DX= 6.0',
  '##DATA TYPE= NMR FID',
  '##DATA CLASS= NTUPLES',
  '##ORIGIN= spinassay example, computed',
  '##OWNER= public domain',
  '##.OBSERVE FREQUENCY= 500.13',
  '##.OBSERVE NUCLEUS= ^1H',
  '##.ACQUISITION MODE= SIMULTANEOUS',
  '##NTUPLES= NMR FID',
  '##VAR_NAME= TIME, FID/REAL, FID/IMAG, PAGE NUMBER',
  '##SYMBOL= X, R, I, N',
  '##VAR_TYPE= INDEPENDENT, DEPENDENT, DEPENDENT, PAGE',
  '##VAR_FORM= AFFN, AFFN, AFFN, AFFN',
  '##VAR_DIM= 16, 16, 16, 2',
  '##UNITS= SECONDS, ARBITRARY UNITS, ARBITRARY UNITS, ',
  '##FIRST= 0, 1000, 0, 1',
  '##LAST= 0.0075, -153, 0, 2',
  '##MIN= 0, -535, -396, 1',
  '##MAX= 0.0075, 1000, 741, 2',
  '##FACTOR= 0.0005, 1, 1, 1',
  '##PAGE= N=1',
  '##DATA TABLE= (X++(R..R)), XYDATA',
  '0 1000 714 241 -212 -491 -535 -382 -129',
  '8 114 263 287 205 69 -61 -141 -153',
  '##PAGE= N=2',
  '##DATA TABLE= (X++(I..I)), XYDATA',
  '0 0 519 741 654 357 0 -278 -396',
  '8 -350 -191 0 149 212 187 102 0',
  '##END NTUPLES= NMR FID',
  '##END=',
  '',
].join('\n');

const conditions = {
  sequence: 'single-pulse',
  flipAngleDegrees: 90,
  recycleDelaySeconds: 25,
  temperatureCelsius: 25,
  pH: 6,
  pHScale: 'meter-reading',
  solvent: 'D2O',
} as const;

/** The same signal as numbers, with its conditions. */
export const acquisitionPostExample: AcquisitionPost = {
  signal: {
    encoding: 'float32',
    data: 'AAB6RAAAAAAAgDJEAMABRAAAcUMAQDlEAABUwwCAI0QAgPXDAICyQwDABcQAAAAAAAC/wwAAi8MAAAHDAADGwwAA5EIAAK/DAICDQwAAP8MAgI9DAAAAAAAATUMAABVDAACKQgAAVEMAAHTCAAA7QwAADcMAAMxCAAAZwwAAAAA=',
    sampleCount: 16,
    dwellSeconds: 0.0005,
    observeFrequencyMHz: 500.13,
  },
  conditions,
};

/** What is stored of it. Digests stand for any digest. */
export const acquisitionExample: Acquisition = {
  id: '0190c3a2-7d55-7c11-9c5e-3f0d6b2f6a01',
  signalSha256: '9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a08',
  conditionsVersion: 1,
  conditionsSha256: 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855',
  conditions,
  declaredConditions: conditions,
  fileConditions: {},
  sampleCount: 16,
  dwellSeconds: 0.0005,
  observeFrequencyMHz: 500.13,
  nucleus: '1H',
  original: {
    mediaType: 'application/json',
    byteCount: 428,
    sha256: '2c26b46b68ffc68ff99b453c1d30413413422d706483bfa0f98a5e886266e7ae',
  },
  receivedAt: '2026-01-17T03:12:45.120Z',
};
