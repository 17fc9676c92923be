import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';

/** A result as its bytes were recorded; `text` is canonical JSON in UTF-8. */
export type StoredResult = {
  readonly text: string;
  readonly sha256: string;
  readonly engineVersion: string;
  readonly numericsId: string;
};

/** The result of a fit, or undefined while there is none. */
export async function readResult(transaction: LaboratoryTransaction, fitId: string): Promise<StoredResult | undefined> {
  const [row] = await transaction[sqlDoor].query<StoredResult>(
    `select result_text as text, sha256, engine_version as "engineVersion", numerics_id as "numericsId"
    from result where laboratory_id = $1 and fit_id = $2`,
    [transaction.laboratoryId, fitId],
  );
  return row;
}
