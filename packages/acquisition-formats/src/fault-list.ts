/** Every kind of fault this room reports. Names are stable: clients may branch on them. */
export const faultCodes = [
  // the file as a whole
  'file-too-large',
  'not-text',
  'line-too-long',
  'too-many-labels',
  'not-jcamp-dx',
  'label-without-equals-sign',
  'missing-end',
  'content-after-end',
  'compound-file',
  'unsupported-version',
  'more-faults',
  // labels and their values
  'missing-label',
  'repeated-label',
  'unreadable-number',
  'number-out-of-range',
  // what was measured
  'processed-spectrum',
  'not-an-nmr-fid',
  'real-only',
  'not-one-dimensional',
  'wrong-nucleus',
  'unsupported-acquisition-mode',
  'unsupported-time-unit',
  // the NTUPLES block and its pages
  'missing-variable',
  'too-many-entries',
  'dimension-differs',
  'sample-count-out-of-range',
  'unsupported-table-form',
  'missing-page',
  'repeated-page',
  'page-mismatch',
  // ordinates
  'unreadable-abscissa',
  'unreadable-ordinate',
  'missing-ordinate',
  'difference-without-start',
  'repeat-without-start',
  'too-many-ordinates',
  'ordinate-count-differs',
  'y-check-failed',
  'x-check-failed',
  'ordinate-check-failed',
  // scales that contradict each other
  'dwell-not-positive',
  'dwell-disagrees',
  'carrier-disagrees',
  'time-zero-disagrees',
  // signals given as numbers
  'unreadable-base64',
  'byte-count-differs',
  'sample-not-finite',
  'unsupported-encoding',
] as const;

export type FaultCode = (typeof faultCodes)[number];

/** One thing that keeps a signal from being read. */
export type Fault = {
  readonly code: FaultCode;
  /** What is wrong and how to put it right. */
  readonly detail: string;
  /** JSON Pointer as a URI fragment, where the signal came as JSON. */
  readonly pointer?: string;
  /** 1-based line of the file. */
  readonly line?: number;
};

/** Collects faults in the order they are found. Beyond its maximum it only counts, and says so in the end. */
export class FaultList {
  readonly #faults: Fault[] = [];
  readonly #countMax: number;
  #unlistedCount = 0;

  constructor(countMax: number) {
    this.#countMax = countMax;
  }

  add(code: FaultCode, detail: string, place: { readonly line?: number; readonly pointer?: string } = {}): void {
    if (this.#faults.length < this.#countMax) this.#faults.push({ code, detail, ...place });
    else this.#unlistedCount += 1;
  }

  get isEmpty(): boolean {
    return this.#faults.length === 0;
  }

  has(code: FaultCode): boolean {
    return this.#faults.some((fault) => fault.code === code);
  }

  toArray(): Fault[] {
    if (this.#unlistedCount === 0) return [...this.#faults];
    const detail = `${this.#unlistedCount} more faults are not listed; put the listed ones right first`;
    return [...this.#faults, { code: 'more-faults', detail }];
  }
}
