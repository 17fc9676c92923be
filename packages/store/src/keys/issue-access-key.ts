import { createHash, randomBytes, randomInt } from 'node:crypto';
import { writeAudit } from '../audit/write-audit.ts';
import { type Store, sqlDoor } from '../sql-door.ts';

/** What a key may do. The same words stand in a check of the table. */
export type Role = 'pipeline' | 'analyst' | 'lims' | 'method-owner' | 'admin' | 'auditor';

export type AccessKeyOrder = {
  readonly laboratoryId: string;
  readonly roles: readonly Role[];
  readonly label: string;
  /** RFC 3339; absent means that the key holds until it is revoked. */
  readonly expiresAt?: string;
};

const idAlphabet = '0123456789abcdefghijklmnopqrstuvwxyz';
const idLength = 12;

/** Make an access key. The token is shown this once: only the digest of its 256 random bits is kept. */
export async function issueAccessKey(store: Store, order: AccessKeyOrder): Promise<{ keyId: string; token: string }> {
  const keyId = Array.from({ length: idLength }, () => idAlphabet.charAt(randomInt(idAlphabet.length))).join('');
  const secret = randomBytes(32).toString('base64url');
  const { laboratoryId, roles, label, expiresAt = null } = order;
  await store.withLaboratory(laboratoryId, async (transaction) => {
    const sql = transaction[sqlDoor];
    await sql.query(
      `insert into access_key (id, laboratory_id, secret_sha256, roles, label, expires_at)
      values ($1, $2, $3, $4, $5, $6)`,
      [keyId, laboratoryId, secretDigest(secret), roles, label, expiresAt],
    );
    await writeAudit(sql, {
      laboratoryId,
      action: 'access-key-issued',
      subject: keyId,
      detail: { roles: roles.join(' ') },
    });
  });
  return { keyId, token: `sa_${keyId}_${secret}` };
}

/** Digest under which a secret is kept. 256 random bits need no slow hash. */
export function secretDigest(secret: string): Buffer {
  return createHash('sha256').update(secret).digest();
}
