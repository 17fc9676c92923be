/** How much of a file is taken. Everything beyond is a fault, never a partial reading. */
export type ReadingLimits = {
  /** Bytes of a file, or characters of a text. */
  readonly byteCountMax: number;
  /** Characters of one line; the standard asks for 80. */
  readonly lineLengthMax: number;
  readonly labelCountMax: number;
  /** Complex samples. */
  readonly sampleCountMin: number;
  readonly sampleCountMax: number;
  /** Faults listed; the rest is counted. */
  readonly faultCountMax: number;
};

/**
 * House limits. The sample counts equal the contract's (a test compares them); 64 MiB hold the longest signal,
 * 2^22 pairs, at 8 characters a component.
 */
export const readingLimits: ReadingLimits = {
  byteCountMax: 64 * 1024 * 1024,
  lineLengthMax: 65_536,
  labelCountMax: 10_000,
  sampleCountMin: 16,
  sampleCountMax: 4_194_304,
  faultCountMax: 50,
};
