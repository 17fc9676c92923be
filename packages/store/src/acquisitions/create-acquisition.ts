import { writeAudit } from '../audit/write-audit.ts';
import { blobDigest, writeBlob } from '../blobs/write-blob.ts';
import { UnknownRowError } from '../one-row.ts';
import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';
import { lookUpAcquisition } from './find-acquisition.ts';
import type { StoredAcquisition } from './stored-acquisition.ts';

export type NewAcquisition = {
  readonly signal: {
    /** Canonical samples: float64, little-endian, interleaved re, im. */
    readonly bytes: Uint8Array;
    /** Digest of the signal: over its canonical header and the bytes. It is the identity of the acquisition. */
    readonly sha256: string;
    readonly sampleCount: number;
    readonly dwellSeconds: number;
    readonly observeFrequencyMHz: number;
    readonly nucleus: '1H';
  };
  /** The bytes as they came. */
  readonly original: { readonly bytes: Uint8Array; readonly mediaType: string };
  readonly title?: string;
  /** Canonical JSON; `sha256` is over `effectiveText`, which the database checks. */
  readonly conditions: {
    readonly effectiveText: string;
    readonly declaredText: string;
    readonly fileText: string;
    readonly sha256: string;
  };
};

/**
 * Take in a signal once a laboratory.
 *
 * `known` gives the acquisition that holds the same signal already and writes nothing: whether its conditions are the same is
 * for the caller to see. Of many that bring the same signal at once, exactly one creates it.
 */
export async function createAcquisition(
  transaction: LaboratoryTransaction,
  acquisition: NewAcquisition,
): Promise<{ outcome: 'created' | 'known'; acquisition: StoredAcquisition }> {
  const { signal, original, conditions } = acquisition;
  const blobs = new Map([signal.bytes, original.bytes].map((bytes) => [blobDigest(bytes), bytes]));
  const id = await insertRow(transaction, acquisition);
  if (id !== undefined) {
    // In order of digest, so that two writers never wait for each other crosswise.
    for (const [sha256, bytes] of [...blobs].sort(([a], [b]) => (a < b ? -1 : 1)))
      await writeBlob(transaction, sha256, bytes);
    await transaction[sqlDoor].query(
      `insert into acquisition_conditions
        (laboratory_id, acquisition_id, version, effective_text, declared_text, file_text, sha256)
      values ($1, $2, 1, $3, $4, $5, $6)`,
      [
        transaction.laboratoryId,
        id,
        conditions.effectiveText,
        conditions.declaredText,
        conditions.fileText,
        conditions.sha256,
      ],
    );
    const entry = { laboratoryId: transaction.laboratoryId, action: 'acquisition-received', subject: id };
    await writeAudit(transaction[sqlDoor], entry);
  }
  const held = await lookUpAcquisition(transaction, { signalSha256: signal.sha256 });
  if (held === undefined) throw new UnknownRowError(`expected the acquisition of signal ${signal.sha256}`);
  return { outcome: id === undefined ? 'known' : 'created', acquisition: held };
}

/** The unique signal digest decides; a row that is just being written by another is waited for. */
async function insertRow(transaction: LaboratoryTransaction, acquisition: NewAcquisition): Promise<string | undefined> {
  const { signal, original, title } = acquisition;
  const [row] = await transaction[sqlDoor].query<{ id: string }>(
    `insert into acquisition (laboratory_id, signal_sha256, sample_count, dwell_seconds, observe_frequency_mhz, nucleus,
      title, original_media_type, original_blob_sha256, signal_blob_sha256)
    values ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10)
    on conflict (laboratory_id, signal_sha256) do nothing returning id`,
    [
      transaction.laboratoryId,
      signal.sha256,
      signal.sampleCount,
      signal.dwellSeconds,
      signal.observeFrequencyMHz,
      signal.nucleus,
      title ?? null,
      original.mediaType,
      blobDigest(original.bytes),
      blobDigest(signal.bytes),
    ],
  );
  return row?.id;
}
