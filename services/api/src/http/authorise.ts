import type { Operation } from '@spinassay/contract';
import { ProblemError } from '@spinassay/problems';
import { authenticate, type Principal } from '@spinassay/store';
import type { Request } from 'express';
import type { ApiDependencies } from '../api-dependencies.ts';

/** The form of a key (`sa_<id>_<secret>`): what is not one never reaches the database. */
const keyForm = /^sa_[A-Za-z0-9-]{1,64}_[A-Za-z0-9_-]{16,128}$/;

/**
 * Who asks, with one of the roles that the operation allows.
 *
 * @throws ProblemError key-missing, key-unknown (one answer for unknown, expired and withdrawn), role-not-sufficient
 * @source RFC 6750 section 2.1 (Authorization: Bearer)
 */
export async function authorise(
  request: Request,
  operation: Operation,
  { store }: Pick<ApiDependencies, 'store'>,
): Promise<Principal> {
  if (operation.roles === 'open') throw new Error(`${operation.operationId} is open and needs no principal`);
  const principal = await principalOf(request, store);
  if (!principal.roles.some((role) => operation.roles.includes(role))) {
    throw new ProblemError({
      slug: 'role-not-sufficient',
      detail: `This operation takes a key with one of the roles ${operation.roles.join(', ')}; yours has ${principal.roles.join(', ')}.`,
    });
  }
  return principal;
}

async function principalOf(request: Request, store: ApiDependencies['store']): Promise<Principal> {
  const [scheme, token] = (request.get('authorization') ?? '').split(/ +/, 2);
  if (scheme?.toLowerCase() !== 'bearer' || token === undefined || token === '') {
    throw new ProblemError({ slug: 'key-missing', detail: 'Send "Authorization: Bearer sa_<id>_<secret>".' });
  }
  const principal = keyForm.test(token) ? await authenticate(store, token) : undefined;
  if (principal === undefined) {
    throw new ProblemError({ slug: 'key-unknown', detail: 'The key is mistyped, expired or withdrawn.' });
  }
  return principal;
}
