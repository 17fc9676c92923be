import type { AnalysisRequest } from '../src/analysis/analysis-request.ts';

/** What the thread beside this file can be told to do. */
export type MadeUpAct =
  | 'answer'
  | 'work until told to stop'
  | 'work and never listen'
  | 'refuse the inputs'
  | 'fail'
  | 'break the contract'
  | 'end the thread';

const digest = '0'.repeat(64);

/** A request of four samples whose method tells the made-up thread what to do. */
export function madeUpRequest(act: MadeUpAct): AnalysisRequest {
  return {
    samples: Float64Array.of(1, 0, 0.5, -0.25, 0.25, 0.125, 1e-7, -1e-300),
    dwellSeconds: 0.0001,
    observeFrequencyMHz: 500.13,
    conditions: {},
    method: { name: act, panel: [{ compoundId: 'tsp' }], reference: { compoundId: 'tsp' }, claims: ['shifts'] },
    compounds: {},
    seed: 1n,
    inputs: {
      signalSha256: digest,
      conditionsSha256: digest,
      methodSha256: digest,
      compoundSha256s: {},
      optionsSha256: digest,
    },
    engineVersion: 'made-up',
    numericsId: 'made-up',
  };
}

/** The program that serves it; it loads built files, because threads cannot run sources. */
export const madeUpThread = new URL('./made-up-thread.mjs', import.meta.url);
