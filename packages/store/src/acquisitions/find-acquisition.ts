import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';
import { type AcquisitionRow, type StoredAcquisition, storedAcquisition } from './stored-acquisition.ts';

/** How to name an acquisition: by its id or by its signal, with its latest conditions or those of one version. */
export type AcquisitionAddress = {
  readonly id?: string;
  readonly signalSha256?: string;
  readonly conditionsVersion?: number;
};

/** The acquisition of this id in the transaction's laboratory, with its latest conditions. */
export function findAcquisition(
  transaction: LaboratoryTransaction,
  id: string,
): Promise<StoredAcquisition | undefined> {
  return lookUpAcquisition(transaction, { id });
}

/** The acquisition at this address, in the transaction's laboratory. */
export async function lookUpAcquisition(
  transaction: LaboratoryTransaction,
  { id, signalSha256, conditionsVersion }: AcquisitionAddress,
): Promise<StoredAcquisition | undefined> {
  const [row] = await transaction[sqlDoor].query<AcquisitionRow>(
    `select acquisition.id, signal_sha256, sample_count, dwell_seconds, observe_frequency_mhz, nucleus, title, received_at,
      original_media_type, original.byte_count as original_byte_count, original_blob_sha256,
      conditions.version as conditions_version, effective_text, declared_text, file_text, conditions.sha256 as conditions_sha256
    from acquisition
    join blob original on original.laboratory_id = acquisition.laboratory_id and original.sha256 = original_blob_sha256
    join acquisition_conditions conditions
      on conditions.laboratory_id = acquisition.laboratory_id and conditions.acquisition_id = acquisition.id
    where acquisition.laboratory_id = $1
      and ($2::uuid is null or acquisition.id = $2)
      and ($3::text is null or signal_sha256 = $3)
      and num_nonnulls($2::uuid, $3::text) > 0
      and ($4::integer is null or conditions.version = $4)
    order by conditions.version desc limit 1`,
    [transaction.laboratoryId, id ?? null, signalSha256 ?? null, conditionsVersion ?? null],
  );
  return row === undefined ? undefined : storedAcquisition(row);
}
