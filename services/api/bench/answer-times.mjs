// How long the interface takes to answer, as a pipeline and a LIMS see it: intake of 1 MB signals, unchanged polls and
// results, over loopback against a PostgreSQL of its own with its usual durability. Prints size, n, p50, p99 and maximum.
import { fork } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { migrateBell } from '@spinassay/job-queue';
import * as store from '@spinassay/store';
import { findPostgres, startPostgres } from '../../../deploy/postgres/index.mjs';

/** 65,536 complex float64 samples are 1 MiB; in base64 the body is 1.4 MB. */
const SAMPLE_COUNT = 65_536;
const INTAKE_COUNT = 100;
const READ_COUNT = 1_000;
const WARM_UP_COUNT = 10;

const folder = await mkdtemp(join(tmpdir(), 'sa-'));
const engine = await findPostgres({ prefer: process.env.SPINASSAY_POSTGRES });
const postgres = await startPostgres({ engine, dataFolder: join(folder, 'data'), socketFolder: join(folder, 's') });
try {
  await store.createDatabaseIfAbsent(postgres.connectionStringFor('postgres'), 'spinassay');
  const databaseUrl = postgres.connectionStringFor('spinassay');
  await store.migrate(databaseUrl);
  await migrateBell(databaseUrl);
  await measure(databaseUrl);
} finally {
  await postgres.stop();
  await rm(folder, { recursive: true, force: true });
}

async function measure(databaseUrl) {
  const opened = store.openStore({ connectionString: databaseUrl, applicationName: 'bench' });
  const { id: laboratoryId } = await store.createLaboratory(opened, { name: 'bench' });
  const roles = ['pipeline', 'method-owner'];
  const { token } = await store.issueAccessKey(opened, { laboratoryId, roles, label: 'bench' });
  const program = fileURLToPath(new URL('../dist/main.js', import.meta.url));
  const env = { PATH: process.env.PATH, PORT: '0', DATABASE_URL: databaseUrl, SPINASSAY_LOG_LEVEL: 'warn' };
  const child = fork(program, [], { env });
  const [{ baseUrl }] = await once(child, 'message');
  const ask = asker(baseUrl, token);
  const ids = await intake(ask);
  const fit = await askForFit(ask, ids[0]);
  await poll(ask, fit);
  await result(ask, fit, { opened, databaseUrl });
  child.kill('SIGTERM');
  await once(child, 'exit');
  await opened.close();
}

function asker(baseUrl, token) {
  return async (method, path, { json, headers } = {}) => {
    const startedAt = performance.now();
    const response = await fetch(baseUrl + path, {
      method,
      headers: { authorization: `Bearer ${token}`, 'content-type': 'application/json', ...headers },
      ...(json === undefined ? {} : { body: json }),
    });
    const text = await response.text();
    return { milliseconds: performance.now() - startedAt, status: response.status, headers: response.headers, text };
  };
}

async function intake(ask) {
  const times = [];
  const ids = [];
  for (let index = 0; index < INTAKE_COUNT + WARM_UP_COUNT; index += 1) {
    const answer = await ask('POST', '/v1/acquisitions', { json: signalBody(index + 1) });
    if (answer.status !== 201) throw new Error(`intake answered ${answer.status}: ${answer.text}`);
    ids.push(JSON.parse(answer.text).id);
    if (index >= WARM_UP_COUNT) times.push(answer.milliseconds);
  }
  print('intake of 65,536 complex samples, one sender', times, '500 ms');
  return ids;
}

/** Numbers of a linear congruence (Park & Miller, Commun. ACM 31 (1988) 1192): noise compresses and repeats nowhere. */
function signalBody(seed) {
  let state = seed;
  const samples = Float64Array.from({ length: 2 * SAMPLE_COUNT }, () => {
    state = (state * 48_271) % 2_147_483_647;
    return state - 1_073_741_824;
  });
  const data = Buffer.from(samples.buffer).toString('base64');
  const scales = { sampleCount: SAMPLE_COUNT, dwellSeconds: 0.0001, observeFrequencyMHz: 500.13 };
  return JSON.stringify({ signal: { encoding: 'float64', data, ...scales } });
}

async function askForFit(ask, acquisitionId) {
  const source = 'invented for this benchmark';
  const groups = [{ label: 'CH3', shiftPpm: 0, shiftScale: 'TSP', spins: [{ label: 'H', protonCount: 9 }], source }];
  const spinSystems = [{ label: 'methyl', count: 1, groups, couplings: [] }];
  const compound = { name: 'tsp', molarMassGramsPerMole: 172, spinSystems, sources: [source] };
  await ask('POST', '/v1/compounds', { json: JSON.stringify({ id: 'tsp', body: compound }) });
  const method = { name: 'tsp', panel: [{ compoundId: 'tsp' }], reference: { compoundId: 'tsp' }, claims: ['shifts'] };
  await ask('POST', '/v1/methods', { json: JSON.stringify({ id: 'tsp', body: method }) });
  const answer = await ask('POST', '/v1/fits', { json: JSON.stringify({ acquisitionId, methodId: 'tsp' }) });
  if (answer.status !== 202) throw new Error(`the fit answered ${answer.status}: ${answer.text}`);
  return JSON.parse(answer.text).id;
}

async function poll(ask, fit) {
  const first = await ask('GET', `/v1/fits/${fit}`);
  const headers = { 'if-none-match': first.headers.get('etag') };
  print('unchanged poll', await repeat(() => ask('GET', `/v1/fits/${fit}`, { headers }), 304), '50 ms');
}

async function result(ask, fit, { opened, databaseUrl }) {
  const connection = { connectionString: databaseUrl, applicationName: 'bench' };
  const session = await store.openWorkerSession(connection, { label: 'bench', wantedConcurrency: 1 });
  const { fence } = await store.claimNext(opened, { workerId: session.workerId, kinds: ['fit'], leaseSeconds: 60 });
  // The size of a result of some ten compounds; its content is nobody's result.
  const resultText = JSON.stringify({ filler: 'x'.repeat(65_536) });
  const { sha256Hex } = await import('@spinassay/contract');
  await store.recordCompleted(opened, fence, {
    resultText,
    resultSha256: sha256Hex(resultText),
    engineVersion: 'bench',
    numericsId: 'bench',
    recommendation: 'held',
  });
  await session.close();
  print('result of 64 KiB', await repeat(() => ask('GET', `/v1/fits/${fit}/result`), 200), '200 ms');
}

async function repeat(once, status) {
  const times = [];
  for (let index = 0; index < READ_COUNT + WARM_UP_COUNT; index += 1) {
    const answer = await once();
    if (answer.status !== status) throw new Error(`expected ${status}, got ${answer.status}: ${answer.text}`);
    if (index >= WARM_UP_COUNT) times.push(answer.milliseconds);
  }
  return times;
}

function print(name, times, target) {
  const sorted = [...times].sort((a, b) => a - b);
  const at = (fraction) => sorted[Math.ceil(fraction * sorted.length) - 1].toFixed(1);
  process.stdout.write(
    `${name}: n ${sorted.length}, p50 ${at(0.5)} ms, p99 ${at(0.99)} ms, max ${at(1)} ms (target p99 <= ${target})\n`,
  );
}
