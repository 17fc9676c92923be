// Runs every benchmark of the house, one after the other, so that none disturbs another. Words after `npm run bench --` choose those
// whose path holds one of them. Ends with the number of benchmarks that failed.
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('..', import.meta.url));
const wanted = process.argv.slice(2);
const found = ['packages', 'services'].flatMap((parent) =>
  readdirSync(join(root, parent))
    .sort()
    .flatMap((room) => benchmarksOf(join(parent, room, 'bench'))),
);
const chosen = found.filter((path) => wanted.length === 0 || wanted.some((word) => path.includes(word)));
if (chosen.length === 0) throw new Error(`no benchmark matches ${wanted.join(', ')}; there are ${found.join(', ')}`);

let failedCount = 0;
for (const path of chosen) {
  process.stdout.write(`\n== ${path}\n`);
  const { status } = spawnSync(process.execPath, [join(root, path)], { cwd: root, stdio: 'inherit' });
  if (status !== 0) failedCount += 1;
}
process.exitCode = failedCount;

function benchmarksOf(folder) {
  if (!existsSync(join(root, folder))) return [];
  return readdirSync(join(root, folder))
    .filter((name) => name.endsWith('.mjs'))
    .sort()
    .map((name) => join(folder, name));
}
