import { canonicalJson, type FitPost, type ResultBody, sha256Hex } from '@spinassay/contract';
import type { FitReferences } from './resolve-fit.ts';

/** Hexadecimal digits in the first 64 bits of a digest. */
const SEED_DIGITS = 16;

/** What a fit is known by. */
export type FitDigests = {
  /** One fit for ever among those that neither failed nor were cancelled. */
  readonly naturalKey: string;
  /** Over the contents of all inputs, not their ids: the same in every laboratory. */
  readonly inputSha256: string;
  /** The first 64 bits of `inputSha256`, in decimal. */
  readonly seed: string;
};

/**
 * The natural key names rows of this laboratory; the input digest names contents, so that the same inputs give the
 * same seed, and with it the same result bytes, anywhere. A repeat is another row with the same inputs.
 */
export function fitDigests(references: FitReferences, repeatReason: FitPost['repeatReason']): FitDigests {
  const { acquisition, method, preparation, optionsSha256 } = references;
  const naturalKey = sha256Hex(
    canonicalJson({
      kind: 'fit',
      acquisitionId: acquisition.id,
      conditionsVersion: acquisition.conditions.version,
      methodId: method.id,
      methodVersion: method.version,
      preparationId: preparation?.id,
      preparationVersion: preparation?.version,
      optionsSha256,
      repeatReason,
    }),
  );
  const inputSha256 = sha256Hex(canonicalJson(resultInputs(references)));
  return { naturalKey, inputSha256, seed: BigInt(`0x${inputSha256.slice(0, SEED_DIGITS)}`).toString() };
}

/** The inputs as the result names them. */
function resultInputs(references: FitReferences): ResultBody['inputs'] {
  const { acquisition, method, preparation, compoundSha256s, optionsSha256 } = references;
  return {
    signalSha256: acquisition.signalSha256,
    conditionsSha256: acquisition.conditions.sha256,
    methodSha256: method.sha256,
    compoundSha256s: { ...compoundSha256s },
    ...(preparation === undefined ? {} : { preparationSha256: preparation.sha256 }),
    optionsSha256,
  };
}
