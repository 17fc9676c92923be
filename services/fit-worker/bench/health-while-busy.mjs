// Whether the interface stays quick while the numerics have every core: /healthz and an unchanged poll of a fit, over loopback, one after
// the other, on the composed stack in a temporary home, first idle, then with a fit in each of as many threads as there are cores.
// Prints n, answered, p50, p99 and maximum, and how many fits were running before and after.
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { availableParallelism, tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';
import { generateSignal } from '@spinassay/signal-generator';

const REQUEST_COUNT = 300;
const WARM_UP_COUNT = 20;
const THREAD_COUNT = availableParallelism();
/** More than are done while the requests run, so that no thread is ever without work. */
const FIT_COUNT = 12 * THREAD_COUNT;
const BUSY_SECONDS_MAX = 60;
const SIGNAL = { sampleCount: 8_192, dwellSeconds: 1 / 6_000 };
const OBSERVE_FREQUENCY_MHZ = 500.13;
const CARRIER_PPM = 4.7;

const home = await mkdtemp(join(tmpdir(), 'sa-'));
const launcher = await launch();
try {
  const ask = asker(JSON.parse(await readFile(join(home, 'access.json'), 'utf8')));
  await measure(ask, 'idle', undefined);
  const ids = await askForFits(ask);
  await untilBusy(ask, ids);
  const before = await runningCount(ask, ids);
  await measure(ask, 'busy', ids.at(-1));
  const after = await runningCount(ask, ids);
  print(`${THREAD_COUNT} threads on ${availableParallelism()} cores; fits running before ${before}, after ${after}`);
  // Figures of a machine that was not busy would say nothing.
  if (after < THREAD_COUNT) throw new Error('the threads ran out of work: raise FIT_COUNT');
} finally {
  // The fits that remain are handed back at once and go with the folder.
  launcher.kill('SIGTERM');
  if (launcher.exitCode === null && launcher.signalCode === null) await once(launcher, 'exit');
  await rm(home, { recursive: true, force: true });
}

async function launch() {
  const program = fileURLToPath(new URL('../../../deploy/launch.mjs', import.meta.url));
  const { npm_lifecycle_event: _, ...environment } = process.env;
  const settings = { PORT: '0', SPINASSAY_HOME: home, SPINASSAY_FIT_CONCURRENCY: String(THREAD_COUNT) };
  const env = { ...environment, ...settings };
  const child = spawn(process.execPath, [program, '--without-demo'], { env, stdio: ['ignore', 'pipe', 'inherit'] });
  let printed = '';
  await new Promise((resolve, reject) => {
    child.stdout.on('data', (chunk) => {
      printed += chunk;
      if (printed.includes('Ctrl-C stops everything')) resolve();
    });
    child.once('exit', () => reject(new Error(`the launcher ended:\n${printed}`)));
  });
  return child;
}

function asker({ baseUrl, keys }) {
  return async (role, method, path, { json, headers } = {}) => {
    const startedAt = performance.now();
    const response = await fetch(baseUrl + path, {
      method,
      headers: { authorization: `Bearer ${keys[role]}`, 'content-type': 'application/json', ...headers },
      ...(json === undefined ? {} : { body: JSON.stringify(json) }),
    });
    const text = await response.text();
    return { milliseconds: performance.now() - startedAt, status: response.status, headers: response.headers, text };
  };
}

/** Health, and where there is one, an unchanged poll of a fit that waits in the queue. */
async function measure(ask, state, waitingId) {
  report(`${state}: /healthz`, await repeat(() => ask('pipeline', 'GET', '/healthz')), 200);
  if (waitingId === undefined) return;
  const path = `/v1/fits/${waitingId}`;
  const first = await ask('pipeline', 'GET', path);
  const headers = { 'if-none-match': first.headers.get('etag') };
  report(`${state}: unchanged poll`, await repeat(() => ask('pipeline', 'GET', path, { headers })), 304);
}

async function repeat(once) {
  const answers = [];
  for (let index = 0; index < REQUEST_COUNT + WARM_UP_COUNT; index += 1) {
    const answer = await once();
    if (index >= WARM_UP_COUNT) answers.push(answer);
  }
  return answers;
}

function report(name, answers, status) {
  const answeredCount = answers.filter((answer) => answer.status === status).length;
  const sorted = answers.map(({ milliseconds }) => milliseconds).sort((a, b) => a - b);
  const at = (fraction) => sorted[Math.ceil(fraction * sorted.length) - 1].toFixed(1);
  print(
    `${name}: answered ${answeredCount} of ${answers.length}, p50 ${at(0.5)} ms, p99 ${at(0.99)} ms, max ${at(1)} ms`,
  );
  if (answeredCount < answers.length) process.exitCode = 1;
}

/** Lactate with TSP, invented: shifts near 1.32 and 4.10 ppm and 6.93 Hz (textbook values, from memory; nothing rests on them). */
async function askForFits(ask) {
  const body = {
    name: 'Lactate in water',
    panel: [{ compoundId: 'lactic-acid' }],
    reference: { compoundId: 'trimethylsilylpropanoate-d4' },
    claims: ['shifts'],
  };
  idOf(await ask('method-owner', 'POST', '/v1/methods', { json: { id: 'lactate', body } }));
  const ids = [];
  for (let seed = 1; seed <= FIT_COUNT; seed += 1) {
    const acquisition = await ask('pipeline', 'POST', '/v1/acquisitions', { json: acquisitionOf(seed) });
    const json = { acquisitionId: idOf(acquisition), methodId: 'lactate' };
    ids.push(idOf(await ask('pipeline', 'POST', '/v1/fits', { json })));
  }
  return ids;
}

function idOf({ status, text }) {
  if (status >= 300) throw new Error(`answered ${status}: ${text}`);
  return JSON.parse(text).id;
}

function acquisitionOf(seed) {
  const hertzOf = (shiftPpm) => (shiftPpm - CARRIER_PPM) * OBSERVE_FREQUENCY_MHZ;
  const group = { responseFactor: 1, decayPerSecond: 3 };
  const spins = [4.1, 1.32, 1.32, 1.32].map((ppm, index) => ({ shiftHz: hertzOf(ppm), group: Math.min(index, 1) }));
  const couplings = [1, 2, 3].map((b) => ({ a: 0, b, couplingHz: 6.93 }));
  const reference = { amount: 1.8, spins: [{ shiftHz: hertzOf(0), group: 0 }], couplings: [], groups: [group] };
  const samples = generateSignal({
    ...SIGNAL,
    components: [{ amount: 1, spins, couplings, groups: [group, group] }, reference],
    timeZeroSamples: 0,
    phaseRadians: 0.1,
    noiseSdPerComponent: 0.01,
    seed,
  });
  const data = Buffer.from(samples.buffer).toString('base64');
  const signal = { encoding: 'float64', data, ...SIGNAL, observeFrequencyMHz: OBSERVE_FREQUENCY_MHZ };
  return { signal, conditions: { sequence: 'single-pulse', carrierPpm: CARRIER_PPM, solvent: 'D2O' } };
}

async function runningCount(ask, ids) {
  const fits = await Promise.all(ids.map((id) => ask('pipeline', 'GET', `/v1/fits/${id}`)));
  return fits.filter(({ text }) => JSON.parse(text).status === 'running').length;
}

async function untilBusy(ask, ids) {
  for (let tries = 0; tries < BUSY_SECONDS_MAX * 10; tries += 1) {
    if ((await runningCount(ask, ids)) === THREAD_COUNT) return;
    await pause(100);
  }
  throw new Error(`not ${THREAD_COUNT} fits running within ${BUSY_SECONDS_MAX} s`);
}

function print(text) {
  process.stdout.write(`${text}\n`);
}
