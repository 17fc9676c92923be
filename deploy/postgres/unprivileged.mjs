import { execFile } from 'node:child_process';
import { promisify } from 'node:util';

const run = promisify(execFile);

/** Users without rights of their own that systems bring along; the first that exists is taken. */
const systemUsers = ['postgres', 'nobody'];

/**
 * How to run a program that refuses to run as root: the words to put before its command.
 *
 * A user namespace needs no user to be made and leaves the files owned by root. Where namespaces are off, a system user
 * takes over, and `owner` says to whom the folders must belong.
 *
 * @returns {Promise<{prefix: string[], owner?: {uid: number, gid: number}}>}
 * @throws Error saying what failed when neither way works
 */
export async function unprivileged() {
  if (process.getuid?.() !== 0) return { prefix: [] };
  const namespace = ['unshare', '--user', '--map-user=1000', '--map-group=1000', '--'];
  const failures = [];
  if (await works(namespace, failures)) return { prefix: namespace };
  for (const user of systemUsers) {
    const owner = await idsOf(user);
    if (owner === undefined) continue;
    const prefix = ['setpriv', `--reuid=${owner.uid}`, `--regid=${owner.gid}`, '--clear-groups', '--'];
    if (await works(prefix, failures)) return { prefix, owner };
  }
  throw new Error(`PostgreSQL does not run as root, and no other user could be taken: ${failures.join('; ')}`);
}

async function works(prefix, failures) {
  try {
    await run(prefix[0], [...prefix.slice(1), 'true']);
    return true;
  } catch (error) {
    failures.push(`${prefix[0]}: ${String(error.stderr || error.message).trim()}`);
    return false;
  }
}

async function idsOf(user) {
  try {
    const [uid, gid] = await Promise.all(['-u', '-g'].map((option) => run('id', [option, user])));
    return { uid: Number(uid.stdout), gid: Number(gid.stdout) };
  } catch {
    return undefined; // No such user here.
  }
}
