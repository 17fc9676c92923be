import { generateSignal } from '@spinassay/signal-generator';
import type { RunningStack } from './running-stack.ts';

const observeFrequencyMHz = 500.13;
const carrierPpm = 4.7;
const sampleCount = 8_192;
const dwellSeconds = 1 / 6_000;
const hertzOf = (shiftPpm: number) => (shiftPpm - carrierPpm) * observeFrequencyMHz;
const group = { responseFactor: 1, decayPerSecond: 3 };

/**
 * An invented sample of lactate with TSP, made by the generator, which shares no code with what fits: shifts near 1.32 and 4.10 ppm, one
 * coupling of 6.93 Hz (textbook values, from memory; nothing is concluded from them here).
 */
function lactateSignal(seed: number): Float64Array {
  const spins = [{ shiftHz: hertzOf(4.1), group: 0 }, ...[1, 2, 3].map(() => ({ shiftHz: hertzOf(1.32), group: 1 }))];
  const couplings = [1, 2, 3].map((methyl) => ({ a: 0, b: methyl, couplingHz: 6.93 }));
  return generateSignal({
    components: [
      { amount: 1, spins, couplings, groups: [group, group] },
      { amount: 9 * 0.2, spins: [{ shiftHz: hertzOf(0), group: 0 }], couplings: [], groups: [group] },
    ],
    sampleCount,
    dwellSeconds,
    timeZeroSamples: 0,
    phaseRadians: 0.1,
    noiseSdPerComponent: 0.01,
    seed,
  });
}

/** Keep the method, post the sample, ask for the fit. @returns the fit's id */
export async function askForInventedFit(stack: RunningStack, seed: number): Promise<string> {
  const body = {
    name: 'Lactate in water',
    panel: [{ compoundId: 'lactic-acid' }],
    reference: { compoundId: 'trimethylsilylpropanoate-d4' },
    claims: ['shifts'],
  };
  await stack.post('method-owner', '/v1/methods', { id: 'lactate-in-water', body });
  const data = Buffer.from(lactateSignal(seed).buffer).toString('base64');
  const signal = { encoding: 'float64', data, sampleCount, dwellSeconds, observeFrequencyMHz };
  const conditions = { sequence: 'single-pulse', carrierPpm, solvent: 'D2O', temperatureCelsius: 25 };
  const acquisition = await stack.post('pipeline', '/v1/acquisitions', { signal, conditions });
  const order = { acquisitionId: idOf(acquisition), methodId: 'lactate-in-water' };
  return idOf(await stack.post('pipeline', '/v1/fits', order));
}

function idOf(answer: unknown): string {
  return String(Reflect.get(Object(answer), 'id'));
}

export type FitAnswer = {
  readonly id: string;
  readonly status: string;
  readonly attempt: number;
  readonly acquisitionId: string;
  readonly methodId: string;
  readonly resultSha256?: string;
};

/** How a fit is at the moment. */
export async function readFit(stack: RunningStack, id: string, waitSeconds?: number): Promise<FitAnswer> {
  return JSON.parse(await stack.read('pipeline', `/v1/fits/${id}`, waitSeconds)) as FitAnswer;
}

/** Wait until a fit is being computed; it takes seconds, and this looks more often. */
export async function untilRunning(stack: RunningStack, id: string): Promise<void> {
  for (let { status } = await readFit(stack, id); status !== 'running'; { status } = await readFit(stack, id)) {
    if (status !== 'queued') throw new Error(`the fit is ${status} already`);
  }
}

/** Wait until a fit has its result. The server holds the question until there is an answer, so this is no polling. */
export async function untilCompleted(stack: RunningStack, id: string): Promise<FitAnswer> {
  let fit = await readFit(stack, id, 30);
  while (fit.status === 'queued' || fit.status === 'running') fit = await readFit(stack, id, 30);
  if (fit.status !== 'completed') throw new Error(`the fit ended: ${JSON.stringify(fit)}`);
  return fit;
}
