import { timingSafeEqual } from 'node:crypto';
import { type Store, sqlDoor } from '../sql-door.ts';
import { type Role, secretDigest } from './issue-access-key.ts';

/** Who asks, for which laboratory, with which rights. */
export type Principal = {
  readonly keyId: string;
  readonly laboratoryId: string;
  readonly roles: readonly Role[];
  readonly label: string;
};

const tokenPattern = /^sa_([0-9a-z]{12})_([A-Za-z0-9_-]{43})$/;

type KeyRow = {
  laboratory_id: string;
  secret_sha256: Buffer;
  roles: Role[];
  label: string;
  is_usable: boolean;
  is_stale: boolean;
};

/**
 * Who holds this token; undefined when it is malformed, unknown, expired or revoked, without saying which.
 *
 * The digests are compared in constant time. `last_used_at` is kept to the minute, so that a busy key is not a hot row.
 */
export async function authenticate(store: Store, token: string): Promise<Principal | undefined> {
  const [, keyId, secret] = tokenPattern.exec(token) ?? [];
  if (keyId === undefined || secret === undefined) return undefined;
  const [row] = await store[sqlDoor].query<KeyRow>(
    `select laboratory_id, secret_sha256, roles, label,
      revoked_at is null and (expires_at is null or expires_at > clock_timestamp()) as is_usable,
      last_used_at is null or last_used_at < clock_timestamp() - interval '1 minute' as is_stale
    from access_key where id = $1`,
    [keyId],
  );
  const isGenuine = timingSafeEqual(row?.secret_sha256 ?? Buffer.alloc(32), secretDigest(secret));
  if (row === undefined || !isGenuine || !row.is_usable) return undefined;
  if (row.is_stale) {
    await store[sqlDoor].query('update access_key set last_used_at = clock_timestamp() where id = $1', [keyId]);
  }
  return { keyId, laboratoryId: row.laboratory_id, roles: row.roles, label: row.label };
}
