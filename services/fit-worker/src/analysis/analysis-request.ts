import type { CompoundBody, Conditions, MethodBody, PreparationBody, ResultBody } from '@spinassay/contract';

/** Everything one analysis needs: wire documents, the signal, and what names the run. */
export interface AnalysisRequest {
  /** Interleaved complex FID. */
  readonly samples: Float64Array;
  readonly dwellSeconds: number;
  readonly observeFrequencyMHz: number;
  readonly conditions: Conditions;
  readonly method: MethodBody;
  /** Every compound the method names, by id. */
  readonly compounds: Readonly<Record<string, { readonly version: number; readonly body: CompoundBody }>>;
  readonly preparation?: PreparationBody | undefined;
  readonly seed: bigint;
  readonly inputs: ResultBody['inputs'];
  readonly engineVersion: string;
  readonly numericsId: string;
}

export interface AnalysisHooks {
  /** Asked between steps of the search. */
  isCancelled(): boolean;
  onProgress(stage: string, fraction: number): void;
}
