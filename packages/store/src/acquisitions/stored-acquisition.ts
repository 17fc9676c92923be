/** One version of the conditions of an acquisition; the texts are canonical JSON as they were written. */
export type StoredConditions = {
  readonly version: number;
  /** In force: declared, else from the file. `sha256` is over this text. */
  readonly effectiveText: string;
  readonly declaredText: string;
  readonly fileText: string;
  readonly sha256: string;
};

/** A signal that was taken in, without its bytes. */
export type StoredAcquisition = {
  readonly id: string;
  readonly signalSha256: string;
  readonly sampleCount: number;
  readonly dwellSeconds: number;
  readonly observeFrequencyMHz: number;
  readonly nucleus: '1H';
  readonly title?: string;
  readonly receivedAt: string;
  readonly original: { readonly mediaType: string; readonly byteCount: number; readonly sha256: string };
  readonly conditions: StoredConditions;
};

export type AcquisitionRow = {
  id: string;
  signal_sha256: string;
  sample_count: number;
  dwell_seconds: number;
  observe_frequency_mhz: number;
  nucleus: '1H';
  title: string | null;
  received_at: Date;
  original_media_type: string;
  original_byte_count: number;
  original_blob_sha256: string;
  conditions_version: number;
  effective_text: string;
  declared_text: string;
  file_text: string;
  conditions_sha256: string;
};

/** The acquisition of a row with its original's size and one version of its conditions. */
export function storedAcquisition(row: AcquisitionRow): StoredAcquisition {
  return {
    id: row.id,
    signalSha256: row.signal_sha256,
    sampleCount: row.sample_count,
    dwellSeconds: row.dwell_seconds,
    observeFrequencyMHz: row.observe_frequency_mhz,
    nucleus: row.nucleus,
    ...(row.title === null ? {} : { title: row.title }),
    receivedAt: row.received_at.toISOString(),
    original: {
      mediaType: row.original_media_type,
      byteCount: row.original_byte_count,
      sha256: row.original_blob_sha256,
    },
    conditions: {
      version: row.conditions_version,
      effectiveText: row.effective_text,
      declaredText: row.declared_text,
      fileText: row.file_text,
      sha256: row.conditions_sha256,
    },
  };
}
