import { serviceIdSchema } from '@spinassay/contract';
import { ProblemError } from '@spinassay/problems';
import { findFit, type LaboratoryTransaction, type StoredFit } from '@spinassay/store';

/** @throws ProblemError unknown-resource for what is not there, not in this laboratory, or not an id at all */
export async function findFitOrRefuse(transaction: LaboratoryTransaction, id: string): Promise<StoredFit> {
  const fit = serviceIdSchema.safeParse(id).success ? await findFit(transaction, id) : undefined;
  if (fit === undefined)
    throw new ProblemError({ slug: 'unknown-resource', detail: `There is no fit ${id.slice(0, 80)}.` });
  return fit;
}
