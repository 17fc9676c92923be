import { readFile, rename, writeFile } from 'node:fs/promises';
import { join } from 'node:path';

const fileName = 'access.json';

/** Where the service is and one key a role, or undefined when there is no such file yet. */
export async function readAccessFile(home) {
  const path = join(home, fileName);
  const text = await readFile(path, 'utf8').catch((error) => {
    if (error.code === 'ENOENT') return undefined;
    throw error;
  });
  if (text === undefined) return undefined;
  try {
    const { baseUrl, keys } = JSON.parse(text);
    return { baseUrl, keys };
  } catch (error) {
    throw new Error(`${path} is not JSON; move it away and new keys will be made`, { cause: error });
  }
}

/** Written beside and moved into place: whoever reads it reads all of it. Its keys open the laboratory, so nobody else may read it. */
export async function writeAccessFile(home, access) {
  const path = join(home, fileName);
  const draft = `${path}.${process.pid}`;
  await writeFile(draft, `${JSON.stringify(access, null, 2)}\n`, { mode: 0o600 });
  await rename(draft, path);
  return path;
}
