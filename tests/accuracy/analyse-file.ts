import { readFileSync } from 'node:fs';
import path from 'node:path';
import { type ReadAcquisition, readAcquisition } from '@spinassay/acquisition-formats';
import { findStarterCompound } from '@spinassay/compound-catalogue';
import {
  type Conditions,
  canonicalJson,
  type MethodBody,
  type PreparationBody,
  type ResultBody,
  resultBodySchema,
  sha256Hex,
} from '@spinassay/contract';
import { type AnalysisRequest, analyseAcquisition } from '@spinassay/fit-worker';

/** Nobody cancels a test. */
const hooks = { isCancelled: () => false, onProgress: () => {} };

/** What a test analyses: a signal, what is declared of it, and the documents. */
export interface AnalysisCase {
  readonly samples: Float64Array;
  readonly dwellSeconds: number;
  readonly observeFrequencyMHz: number;
  readonly conditions: Conditions;
  readonly method: MethodBody;
  readonly compounds: AnalysisRequest['compounds'];
  readonly preparation?: PreparationBody;
  readonly seed?: bigint;
}

/** The whole analysis of the worker, without queue and store; the result is checked against the contract. */
export function analyse(given: AnalysisCase): ResultBody {
  const digest = sha256Hex(canonicalJson(given.method));
  const result = analyseAcquisition(
    {
      ...given,
      seed: given.seed ?? 20261201n,
      inputs: {
        signalSha256: sha256Hex(new Uint8Array(given.samples.buffer)),
        conditionsSha256: sha256Hex(canonicalJson(given.conditions)),
        methodSha256: digest,
        compoundSha256s: {},
        optionsSha256: sha256Hex('{}'),
      },
      engineVersion: 'test',
      numericsId: 'test',
    },
    hooks,
  );
  return resultBodySchema.parse(result);
}

/** Read a measured FID of the reference data. */
export function readFile(folder: string, file: string): ReadAcquisition {
  const reading = readAcquisition(readFileSync(path.join(folder, file)));
  if (!reading.ok) throw new Error(`${file}: ${reading.faults.map((fault) => fault.detail).join('; ')}`);
  return reading.acquisition;
}

/** Entries of the starter catalogue as the worker gets them. */
export function starterCompounds(...ids: string[]): AnalysisRequest['compounds'] {
  return Object.fromEntries(
    ids.map((id) => {
      const entry = findStarterCompound(id);
      if (entry === undefined) throw new Error(`the starter catalogue has no ${id}`);
      return [id, { version: 1, body: entry.body }];
    }),
  );
}

/** A method of one compound of the starter catalogue. */
export function oneCompoundMethod(compoundId: string, referenceId: string, rest: Partial<MethodBody> = {}): MethodBody {
  return {
    name: `only ${compoundId}`,
    panel: [{ compoundId, compoundVersion: 1 }],
    reference: { compoundId: referenceId, compoundVersion: 1 },
    claims: ['shifts', 'ratios'],
    ...rest,
  };
}
