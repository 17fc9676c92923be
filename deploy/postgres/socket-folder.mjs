import { createHash } from 'node:crypto';
import { chmod, lstat, mkdir } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';

/** A Unix socket path holds 107 bytes (108 with its zero on Linux, 104 on macOS); the file is `/.s.PGSQL.5432.lock` at the longest. */
const folderBytesMax = 103 - '/.s.PGSQL.5432.lock'.length;

/** See index.d.mts. */
export async function socketFolderFor(homeFolder) {
  const inside = join(resolve(homeFolder), 'socket');
  const isShort = Buffer.byteLength(inside) <= folderBytesMax;
  const folder = isShort ? inside : join(tmpdir(), `spinassay-${ownerId()}-${shortDigest(inside)}`);
  await mkdir(folder, { recursive: true, mode: 0o700 });
  if (!isShort) await refuseForeign(folder);
  await chmod(folder, 0o700);
  return folder;
}

const ownerId = () => process.getuid?.() ?? 0;
const shortDigest = (text) => createHash('sha256').update(text).digest('hex').slice(0, 12);

/** The temporary folder is shared: another user, or a link set by one, must not receive our database. */
async function refuseForeign(folder) {
  const found = await lstat(folder);
  if (!found.isDirectory() || (process.getuid !== undefined && found.uid !== process.getuid())) {
    throw new Error(
      `expected ${folder} to be a folder of this user; remove it, or set SPINASSAY_HOME to a shorter path`,
    );
  }
}
