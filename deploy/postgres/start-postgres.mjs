import { execFile, spawn } from 'node:child_process';
import { chmod, chown, mkdir, open, readFile, rm, stat } from 'node:fs/promises';
import { dirname, join, resolve } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { promisify } from 'node:util';
import { majorOf } from './find-postgres.mjs';
import { probeServer } from './probe-server.mjs';
import { unprivileged } from './unprivileged.mjs';

const run = promisify(execFile);
const superuser = 'spinassay';
const startSecondsMax = 60;
const stopSecondsMax = 60;
const pollMilliseconds = 20;
/** Permission of others to pass through a folder. */
const passable = 0o001;

/** Reached through a 0700 folder only; connection count is the budget of one machine (see the store's README). */
const houseSettings = {
  listen_addresses: '',
  unix_socket_permissions: '0700',
  max_connections: '100',
  shared_buffers: '64MB',
};

/** See index.d.mts. */
export async function startPostgres({ engine, dataFolder, socketFolder, logFile, settings = {} }) {
  const place = { dataFolder: resolve(dataFolder), socketFolder: resolve(socketFolder) };
  const address = { socketPath: join(place.socketFolder, '.s.PGSQL.5432'), user: superuser, database: 'postgres' };
  await refuseOtherMajor(engine, place.dataFolder);
  if ((await probeServer(address)) !== 'absent') return takeOver(place, address);

  const identity = await unprivileged();
  await makeFolders(engine, place, identity);
  await clearLockOfZombie(place.dataFolder);
  const log = logFile ?? join(dirname(place.dataFolder), 'postgres.log');
  const child = await launch({ engine, place, identity, log, settings: { ...houseSettings, ...settings } });
  await untilAnswering(address, child, log);
  return serverOf(place, true, () => stopChild(child));
}

async function refuseOtherMajor(engine, dataFolder) {
  const major = await majorOf(dataFolder);
  if (major !== undefined && major !== engine.major) {
    throw new Error(
      `the data in ${dataFolder} was made by PostgreSQL ${major}, the one found is ${engine.version} (${engine.kind}, ${engine.binFolder}). ` +
        `Install PostgreSQL ${major}, choose with SPINASSAY_POSTGRES=installed or embedded, or set SPINASSAY_HOME to a new folder.`,
    );
  }
}

async function makeFolders(engine, { dataFolder, socketFolder }, { prefix, owner }) {
  for (const folder of [dataFolder, socketFolder]) {
    await mkdir(folder, { recursive: true, mode: 0o700 });
    if (owner !== undefined) await handOver(folder, owner);
    await chmod(folder, 0o700);
  }
  if ((await majorOf(dataFolder)) !== undefined) return;
  // Locale C: the order of texts must not depend on the machine. Trust: the folder of the socket is the lock.
  const options = [
    '-D',
    dataFolder,
    '-U',
    superuser,
    '--auth=trust',
    '--encoding=UTF8',
    '--locale=C',
    '--no-instructions',
  ];
  await run(...commandOf(prefix, join(engine.binFolder, 'initdb'), options));
}

/** Another user has to be let through the folder above, not into it. Folders further up are not ours to open. */
async function handOver(folder, { uid, gid }) {
  await chown(folder, uid, gid);
  const above = dirname(folder);
  const { mode } = await stat(above);
  if ((mode & passable) === 0) await chmod(above, (mode & 0o7777) | passable);
}

const commandOf = (prefix, program, options) =>
  prefix.length === 0 ? [program, options] : [prefix[0], [...prefix.slice(1), program, ...options]];

/** Detached, so that a Ctrl-C at the terminal reaches the launcher alone, which stops the database last. */
async function launch({ engine, place, identity, log, settings }) {
  const options = ['-D', place.dataFolder, '-k', place.socketFolder];
  for (const [name, value] of Object.entries(settings)) options.push('-c', `${name}=${value}`);
  const output = await open(log, 'a', 0o600);
  try {
    const command = commandOf(identity.prefix, join(engine.binFolder, 'postgres'), options);
    return spawn(...command, { stdio: ['ignore', output.fd, output.fd], detached: true, cwd: place.dataFolder });
  } finally {
    await output.close();
  }
}

async function untilAnswering(address, child, log) {
  let failure;
  child.once('error', (error) => {
    failure = error.message;
  });
  const deadline = Date.now() + startSecondsMax * 1_000;
  while ((await probeServer(address)) !== 'answers') {
    if (child.exitCode !== null || child.signalCode !== null)
      failure ??= `it ended with ${child.exitCode ?? child.signalCode}`;
    if (Date.now() > deadline) failure ??= `no answer within ${startSecondsMax} s`;
    if (failure !== undefined) {
      child.kill('SIGQUIT');
      throw new Error(`PostgreSQL did not start: ${failure}. End of ${log}:\n${await endOf(log)}`);
    }
    await pause(pollMilliseconds);
  }
}

const endOf = async (log) => (await readFile(log, 'utf8').catch(() => '')).split('\n').slice(-12).join('\n');

function serverOf({ socketFolder }, isStartedHere, stop) {
  const connectionStringFor = (database) =>
    `postgresql://${superuser}@/${encodeURIComponent(database)}?host=${encodeURIComponent(socketFolder)}`;
  return { isStartedHere, connectionStringFor, stop };
}

/** SIGINT is the fast shutdown: it does not wait for clients (`PostgreSQL documentation, Shutting Down the Server`). */
async function stopChild(child) {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const gone = new Promise((finish) => child.once('exit', finish));
  child.kill('SIGINT');
  await gone;
}

/** A launcher that was killed leaves its server running; the next one goes on with it and stops it in the end. */
async function takeOver(place, address) {
  const deadline = Date.now() + startSecondsMax * 1_000;
  while ((await probeServer(address)) !== 'answers') {
    if (Date.now() > deadline) throw new Error(`the PostgreSQL on ${address.socketPath} does not accept connections`);
    await pause(pollMilliseconds);
  }
  return serverOf(place, false, () => stopTakenOver(place.dataFolder));
}

async function stopTakenOver(dataFolder) {
  const pid = await lockedPid(dataFolder);
  if (pid === undefined) return;
  process.kill(pid, 'SIGINT');
  const deadline = Date.now() + stopSecondsMax * 1_000;
  while ((await lockedPid(dataFolder)) === pid) {
    if (Date.now() > deadline) throw new Error(`PostgreSQL (process ${pid}) did not stop within ${stopSecondsMax} s`);
    await pause(pollMilliseconds);
  }
}

/** First line of the lock file: the process that serves this folder. */
async function lockedPid(dataFolder) {
  const text = await readFile(join(dataFolder, 'postmaster.pid'), 'utf8').catch(() => '');
  const pid = Number.parseInt(text, 10);
  return Number.isInteger(pid) ? pid : undefined;
}

/** A server that was killed and never reaped counts as alive for PostgreSQL and would block every start. Linux only. */
async function clearLockOfZombie(dataFolder) {
  const pid = await lockedPid(dataFolder);
  if (pid === undefined) return;
  const status = await readFile(`/proc/${pid}/stat`, 'utf8').catch(() => '');
  if (/^\d+ \(.*\) Z /s.test(status)) await rm(join(dataFolder, 'postmaster.pid'), { force: true });
}
