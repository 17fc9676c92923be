import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';
import { type FitRow, type StoredFit, storedFit } from './stored-fit.ts';

/** The fit of this id in the transaction's laboratory. */
export async function findFit(transaction: LaboratoryTransaction, id: string): Promise<StoredFit | undefined> {
  const [row] = await transaction[sqlDoor].query<FitRow>(
    `select fit.id, state, stage, fraction, attempt, cancel_requested, acquisition_id, conditions_version, method_id,
      method_version, preparation_id, preparation_version, options_text, repeat_reason, input_sha256, seed::text as seed,
      result.sha256 as result_sha256, problem, job.created_at, finished_at, revision
    from fit
    join job on job.laboratory_id = fit.laboratory_id and job.id = fit.id
    left join result on result.laboratory_id = fit.laboratory_id and result.fit_id = fit.id
    where fit.laboratory_id = $1 and fit.id = $2`,
    [transaction.laboratoryId, id],
  );
  return row === undefined ? undefined : storedFit(row);
}
