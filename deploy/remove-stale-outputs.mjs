import { existsSync } from 'node:fs';
import { readdir, rm } from 'node:fs/promises';
import { join, relative } from 'node:path';

const outputEndings = /\.(?:d\.ts|js)(?:\.map)?$/;

/**
 * Remove built files whose source has gone. The compiler leaves them, but the digest that names the numerics is made over built files:
 * an old checkout and a fresh one of the same commit must have the same.
 *
 * @returns {Promise<string[]>} what was removed
 */
export async function removeStaleOutputs(root) {
  const removed = [];
  for (const room of await rooms(root)) {
    const dist = join(room, 'dist');
    // An image carries no sources: nothing can be told stale there.
    if (!existsSync(dist) || !existsSync(join(room, 'src'))) continue;
    for (const entry of await readdir(dist, { recursive: true, withFileTypes: true })) {
      const path = join(entry.parentPath, entry.name);
      if (!entry.isFile() || !outputEndings.test(entry.name) || hasSource(room, relative(dist, path))) continue;
      await rm(path, { force: true });
      removed.push(path);
    }
  }
  return removed;
}

async function rooms(root) {
  const found = [];
  for (const parent of ['packages', 'services']) {
    const folder = join(root, parent);
    for (const name of existsSync(folder) ? await readdir(folder) : []) found.push(join(folder, name));
  }
  return found;
}

function hasSource(room, output) {
  return existsSync(join(room, 'src', output.replace(outputEndings, '.ts')));
}
