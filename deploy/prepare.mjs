// Makes a checkout ready to run: dependencies exactly as locked, and everything built. Before `npm start`, `npm test` and the like.
// Needs nothing but Node and npm. Does only what is due, says what it does, and waits for another one that is at it already.
import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync } from 'node:fs';
import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { socketFolderFor } from './postgres/index.mjs';
import { removeStaleOutputs } from './remove-stale-outputs.mjs';
import { takeLock } from './take-lock.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
/** Inside node_modules, so that it goes when they go. */
const stamp = join(root, 'node_modules', '.locked-as');

/** Install and build what is due. @throws Error when a step ends with another status than 0 */
export async function prepare() {
  const startedAt = performance.now();
  const lock = await takeLockOrWait();
  try {
    await install();
    const removed = await removeStaleOutputs(root);
    if (removed.length > 0) say(`removed ${removed.length} built files whose source is gone`);
    say('building what has changed (tsc -b)');
    await run(process.execPath, [join(root, 'node_modules/typescript/bin/tsc'), '-b']);
  } finally {
    await lock.release();
  }
  say(`ready after ${((performance.now() - startedAt) / 1_000).toFixed(1)} s`);
}

async function takeLockOrWait() {
  const socketPath = join(await socketFolderFor(join(root, '.spinassay')), 'prepare.lock');
  for (;;) {
    const lock = await takeLock(socketPath);
    if (lock.isTaken) return lock;
    say(`waiting for process ${lock.holderPid}, which prepares this folder already`);
    await lock.untilReleased();
  }
}

async function install() {
  const wanted = createHash('sha256')
    .update(await readFile(join(root, 'package-lock.json')))
    .digest('hex');
  const found = existsSync(stamp) ? await readFile(stamp, 'utf8') : undefined;
  if (found === wanted) return say('dependencies are as locked');
  say(
    found === undefined ? 'installing dependencies (npm ci)' : 'the lock has changed: installing dependencies (npm ci)',
  );
  // npm names its own script when it runs ours, so that the same npm is used again.
  const { npm_execpath: npm } = process.env;
  await (npm === undefined ? run('npm', ['ci']) : run(process.execPath, [npm, 'ci']));
  await writeFile(stamp, wanted);
}

function run(program, parameters) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, parameters, { cwd: root, stdio: ['ignore', 'inherit', 'inherit'] });
    child.once('error', reject);
    child.once('exit', (code, signal) => {
      if (code === 0) resolve();
      else reject(new Error(`${[program, ...parameters].join(' ')} ended with ${code ?? signal}`));
    });
  });
}

function say(text) {
  process.stdout.write(`prepare: ${text}\n`);
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await prepare().catch((error) => {
    process.stderr.write(`prepare: ${error.message}\n`);
    process.exitCode = 1;
  });
}
