import { serviceIdSchema } from '@spinassay/contract';
import { ProblemError } from '@spinassay/problems';

/**
 * Look an acquisition up by the id in the path.
 *
 * @throws ProblemError unknown-resource for what is not there, not in this laboratory, or not an id at all
 */
export async function findOrRefuse<T>(id: string, find: (id: string) => Promise<T | undefined>): Promise<T> {
  const found = serviceIdSchema.safeParse(id).success ? await find(id) : undefined;
  if (found === undefined) {
    throw new ProblemError({ slug: 'unknown-resource', detail: `There is no acquisition ${id.slice(0, 80)}.` });
  }
  return found;
}
