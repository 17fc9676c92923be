import { type ChildProcess, execFile, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';

const run = promisify(execFile);
const launcher = fileURLToPath(new URL('../../deploy/launch.mjs', import.meta.url));

export type Access = { readonly baseUrl: string; readonly keys: Readonly<Record<string, string>> };

export type LauncherProcess = {
  readonly process: ChildProcess;
  /** Resolves once the launcher says that it serves; rejects with what it printed when it ends before. */
  readonly ready: Promise<void>;
  readonly ended: Promise<number | NodeJS.Signals>;
  printed(): string;
};

/** A home folder in the system's temporary folder; remove it after use. */
export async function makeHome(): Promise<{ home: string; remove(): Promise<void> }> {
  const home = await mkdtemp(join(tmpdir(), 'sa-'));
  return { home, remove: () => rm(home, { recursive: true, force: true }) };
}

const launched = new Set<LauncherProcess>();

/** Stop every launcher of this file that still runs, as Ctrl-C does. */
export async function endLaunchers(): Promise<void> {
  for (const { process, ended } of launched) {
    process.kill('SIGINT');
    await ended;
  }
}

/** Start the launcher as an operator would, on a port that the system chooses. */
export function launch(home: string, environment: Readonly<Record<string, string>> = {}): LauncherProcess {
  const env = { ...launcherEnvironment(), SPINASSAY_HOME: home, PORT: '0', ...environment };
  const child = spawn(process.execPath, [launcher, '--without-demo'], { env, stdio: ['ignore', 'pipe', 'pipe'] });
  const parts: string[] = [];
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (chunk) => parts.push(String(chunk)));
  const printed = () => parts.join('');
  const ended = once(child, 'close').then(([code, signal]) => (code ?? signal) as number | NodeJS.Signals);
  const ready = new Promise<void>((resolve, reject) => {
    child.stdout.on('data', () => printed().includes('Ctrl-C stops everything') && resolve());
    ended.then((how) => reject(new Error(`the launcher ended (${how}):\n${printed()}`)));
  });
  ready.catch(() => {}); // Whoever waits for it hears it; a test may only wait for the end.
  const started: LauncherProcess = { process: child, ready, ended, printed };
  launched.add(started);
  ended.finally(() => launched.delete(started));
  return started;
}

/** Without what the test runner and npm have set for themselves, and with a database of its own for every home. */
function launcherEnvironment(): Record<string, string> {
  const kept = ['PATH', 'HOME', 'TMPDIR', 'LANG', 'SPINASSAY_POSTGRES'];
  return Object.fromEntries(kept.flatMap((key) => (process.env[key] === undefined ? [] : [[key, process.env[key]]])));
}

export type RunningStack = LauncherProcess & {
  readonly home: string;
  readonly access: Access;
  /** Send JSON as a role. Rejects when the answer is not 2xx. */
  post(role: string, path: string, json: object): Promise<unknown>;
  /** Read as a role; gives back the text of the body. With `waitSeconds` the server waits for a fit to end. Rejects as above. */
  read(role: string, path: string, waitSeconds?: number): Promise<string>;
  /** Stop it as Ctrl-C does; the home folder stays. */
  stop(): Promise<void>;
};

/** A stack that serves. */
export async function startStack(
  home: string,
  environment: Readonly<Record<string, string>> = {},
): Promise<RunningStack> {
  const started = launch(home, environment);
  await started.ready;
  const access = JSON.parse(await readFile(join(home, 'access.json'), 'utf8')) as Access;
  const ask = async (role: string, path: string, { headers, ...init }: RequestInit): Promise<string> => {
    const authorization = `Bearer ${access.keys[role]}`;
    const response = await fetch(access.baseUrl + path, { ...init, headers: { ...headers, authorization } });
    const body = await response.text();
    if (!response.ok) throw new Error(`${path} answered ${response.status}: ${body}`);
    return body;
  };
  return {
    ...started,
    home,
    access,
    post: async (role, path, json) => {
      const headers = { 'content-type': 'application/json' };
      return JSON.parse(await ask(role, path, { method: 'POST', headers, body: JSON.stringify(json) }));
    },
    read: (role, path, waitSeconds) =>
      ask(role, path, waitSeconds === undefined ? {} : { headers: { prefer: `wait=${waitSeconds}` } }),
    stop: async () => {
      started.process.kill('SIGINT');
      await started.ended;
    },
  };
}

export type ListedProcess = { readonly pid: number; readonly ppid: number; readonly command: string };

/** Every process of this machine whose command line or parent leads to the launcher: children, and what carries the home folder. */
export async function processesOf(home: string, launcherPid: number | undefined): Promise<ListedProcess[]> {
  const { stdout } = await run('ps', ['-e', '-o', 'pid=,ppid=,args=']);
  return stdout
    .split('\n')
    .map((line) => /^\s*(\d+)\s+(\d+)\s+(.*)$/.exec(line))
    .flatMap((match) =>
      match === null ? [] : [{ pid: Number(match[1]), ppid: Number(match[2]), command: match[3] ?? '' }],
    )
    .filter(({ ppid, command }) => ppid === launcherPid || command.includes(home));
}

/**
 * Commands of those that still run. One that has ended and that nobody has collected (state Z) does not: the first process of a
 * container may collect nobody.
 */
export async function stillRunning(processes: readonly ListedProcess[]): Promise<string[]> {
  const { stdout } = await run('ps', ['-e', '-o', 'pid=,stat=']);
  const states = new Map(stdout.split('\n').map((line) => line.trim().split(/\s+/) as [string, string]));
  const isRunning = (state: string | undefined) => state !== undefined && !state.startsWith('Z');
  return processes.filter(({ pid }) => isRunning(states.get(String(pid)))).map(({ command }) => command);
}

/** Process id of the worker under a launcher. */
export async function workerPid({ home, process: { pid } }: RunningStack): Promise<number> {
  const found = (await processesOf(home, pid)).find(({ command }) => command.includes('fit-worker'));
  if (found === undefined) throw new Error('there is no worker under this launcher');
  return found.pid;
}
