import { execFile } from 'node:child_process';
import { mkdir, mkdtemp, readFile, rm, stat, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { findPostgres, type PostgresEngine, socketFolderFor, startPostgres } from './index.mjs';

const run = promisify(execFile);
let home = '';
beforeEach(async () => {
  home = await mkdtemp(join(tmpdir(), 'sa-'));
});
afterEach(() => rm(home, { recursive: true, force: true }));

const start = async (engine: PostgresEngine) =>
  startPostgres({ engine, dataFolder: join(home, 'data'), socketFolder: await socketFolderFor(home) });

const pidOf = async () => Number.parseInt(await readFile(join(home, 'data', 'postmaster.pid'), 'utf8'), 10);
const lives = (pid: number) =>
  run('ps', ['-p', String(pid), '-o', 'stat=']).then(
    ({ stdout }) => !stdout.startsWith('Z'),
    () => false,
  );

async function enginesHere(): Promise<PostgresEngine[]> {
  const found = await Promise.allSettled(['installed', 'embedded'].map((prefer) => findPostgres({ prefer })));
  return found.flatMap((outcome) => (outcome.status === 'fulfilled' ? [outcome.value] : []));
}

describe.each(await enginesHere())('PostgreSQL $version ($kind)', (engine) => {
  test('starts on a new folder, is taken over by a second start, and leaves no process when stopped', async () => {
    const server = await start(engine);
    expect(server.isStartedHere).toBe(true);
    expect(server.connectionStringFor('a b')).toBe(
      `postgresql://spinassay@/a%20b?host=${encodeURIComponent(join(home, 'socket'))}`,
    );
    expect(((await stat(join(home, 'socket'))).mode & 0o777).toString(8)).toBe('700');
    const pid = await pidOf();
    expect((await start(engine)).isStartedHere).toBe(false);
    await server.stop();
    expect(await lives(pid)).toBe(false);
  });

  test('lets the one who took it over stop it', async () => {
    const first = await start(engine);
    const pid = await pidOf();
    await (await start(engine)).stop();
    await first.stop();
    expect(await lives(pid)).toBe(false);
  });

  test('starts again after it was killed', async () => {
    await start(engine);
    process.kill(await pidOf(), 'SIGKILL');
    const again = await start(engine);
    await again.stop();
  });

  test.runIf(process.getuid?.() === 0)('starts as another user where root may make no user namespace', async () => {
    const path = process.env['PATH'];
    await mkdir(join(home, 'bin'));
    await writeFile(join(home, 'bin', 'unshare'), '#!/bin/sh\nexit 1\n', { mode: 0o755 });
    try {
      process.env['PATH'] = `${join(home, 'bin')}:${path}`;
      const server = await start(engine);
      expect((await stat(join(home, 'data'))).uid).not.toBe(0);
      expect((await start(engine)).isStartedHere).toBe(false);
      await server.stop();
    } finally {
      process.env['PATH'] = path;
    }
  });

  test('refuses the data of another major by name', async () => {
    await mkdir(join(home, 'data'));
    await writeFile(join(home, 'data', 'PG_VERSION'), '9\n');
    await expect(start(engine)).rejects.toThrow(/made by PostgreSQL 9, the one found is/);
  });

  test('tells the end of its log when it does not come up', async () => {
    await (await start(engine)).stop();
    await writeFile(join(home, 'data', 'postgresql.conf'), 'no_such_setting = 1\n');
    await expect(start(engine)).rejects.toThrow(/no_such_setting/);
  });
});

test('has at least one engine to try here', async () => {
  expect((await enginesHere()).length).toBeGreaterThan(0);
});

test('chooses the engine that made the data, where it is there, unless one kind is forced', async () => {
  await mkdir(join(home, 'data'));
  for (const engine of await enginesHere()) {
    await writeFile(join(home, 'data', 'PG_VERSION'), `${engine.major}\n`);
    expect((await findPostgres({ dataFolder: join(home, 'data') })).major).toBe(engine.major);
    expect((await findPostgres({ prefer: engine.kind })).kind).toBe(engine.kind);
  }
  await expect(findPostgres({ prefer: 'other' })).rejects.toThrow(/SPINASSAY_POSTGRES/);
});

test('moves the socket to a short folder when the path of the home is too long for one', async () => {
  const long = join(home, 'x'.repeat(90));
  const folder = await socketFolderFor(long);
  // Linux unix(7): sun_path holds 108 bytes with its zero.
  expect(Buffer.byteLength(join(folder, '.s.PGSQL.5432'))).toBeLessThan(108);
  expect(await socketFolderFor(long)).toBe(folder);
  await rm(folder, { recursive: true });
});
