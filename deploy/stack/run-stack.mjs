import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { socketFolderFor } from '../postgres/index.mjs';
import { takeLock } from '../take-lock.mjs';
import { readAccessFile, writeAccessFile } from './access-file.mjs';
import { furnishLaboratory } from './furnish-laboratory.mjs';
import { hearStopSignals } from './hear-stop-signals.mjs';
import { openDatabase } from './open-database.mjs';
import { createServiceProcess } from './service-process.mjs';

/** A database that was told to stop needs a moment; in a hurry it gets this one and ends by itself afterwards. */
const hurrySeconds = 3;

/**
 * Start database, API and worker, serve until told to stop, and stop them in the order worker, API, database.
 *
 * @throws Error after everything that was started has been stopped again
 */
export async function runStack(options) {
  const { home } = options;
  await mkdir(join(home, 'logs'), { recursive: true, mode: 0o700 });
  const lock = await takeLock(join(await socketFolderFor(home), 'launcher.lock'));
  if (!lock.isTaken) {
    throw new Error(
      `another launcher (process ${lock.holderPid}) runs with ${home}. Stop it first, or set SPINASSAY_HOME to another folder and PORT to another port.`,
    );
  }
  /** What was started, the last first: the order to stop in. */
  const started = [];
  const signals = hearStopSignals(() => leaveAtOnce(started));
  try {
    await start(options, started, signals.isHeard);
    say(`stopping (${await signals.first})`);
  } finally {
    for (const { name, stop } of [...started]) {
      await stop();
      say(`${name} stopped`);
    }
    await lock.release();
  }
  process.exit(0);
}

/** Told to stop while it starts, it ends what it is at and begins nothing more. */
async function start(options, started, isStopping) {
  const { home } = options;
  const database = await openDatabase(options);
  started.unshift({ name: 'database', stop: database.stop });
  say(`database: ${database.description}`);

  const access = await readAccessFile(home);
  const laboratory = await furnishLaboratory({ databaseUrl: database.url, keys: access?.keys });
  const address = { port: options.port };
  const keep = (baseUrl) => writeAccessFile(home, { baseUrl, keys: laboratory.keys });
  // Before anybody can ask whether the service is ready: who sees it ready finds the keys.
  await keep(options.publicUrl ?? `http://${options.host}:${options.port}`);
  if (isStopping()) return;

  const environment = () => ({ ...process.env, DATABASE_URL: database.url, PORT: String(address.port) });
  const { api, worker } = serviceProcesses(options, environment);
  started.unshift({ name: 'API', ...api });
  const { baseUrl } = await api.start();
  // A port that the system has chosen is kept when the API has to be started again.
  if (options.port === 0) address.port = Number(new URL(baseUrl).port);
  const accessPath = await keep(baseUrl);
  if (isStopping()) return;

  started.unshift({ name: 'worker', ...worker });
  await worker.start();
  sayWhatIsThere({ ...options, ...laboratory, baseUrl, accessPath, wasThere: access !== undefined });
}

function serviceProcesses({ root, home }, environment) {
  const create = (name, folder, readyEvent) =>
    createServiceProcess({
      name,
      program: join(root, 'services', folder, 'dist', 'main.js'),
      logFile: join(home, 'logs', `${folder}.log`),
      readyEvent,
      environment,
      say,
    });
  return { api: create('API', 'api', 'api-listening'), worker: create('worker', 'fit-worker', 'fit-worker-ready') };
}

function sayWhatIsThere({ baseUrl, accessPath, home, isNew, wasThere, issuedCount, compoundCount, isDemoWanted }) {
  if (isNew) say(`made a laboratory with ${compoundCount} compounds and one key a role`);
  else if (wasThere && issuedCount === 0) say(`found the laboratory with ${compoundCount} compounds and its keys`);
  else say(`found the laboratory with ${compoundCount} compounds; made ${issuedCount} new keys`);
  if (isNew && isDemoWanted) say('there is no demo yet: the laboratory starts without methods and acquisitions');
  say(`serving at     ${baseUrl}`);
  say(`documentation  ${baseUrl}/docs/`);
  say(`keys           ${accessPath} (one a role; keep it to yourself)`);
  say(`logs           ${join(home, 'logs')}`);
  say('next           the curl lines of README.md: make a method, post a spectrum, ask for a fit, read its result');
  say('Ctrl-C stops everything');
}

/** A second wish to stop: no draining. The database ends its work in order even when nobody waits for it. */
async function leaveAtOnce(started) {
  say('leaving at once');
  for (const { kill } of started) kill?.();
  const database = started.find(({ name }) => name === 'database');
  await Promise.race([database?.stop(), pause(hurrySeconds * 1_000)]);
  process.exit(1);
}

function say(text) {
  process.stdout.write(`spinassay: ${text}\n`);
}
