import type { NoiseEstimate } from '@spinassay/signal-processing';
import type { IntensityBroadening } from './intensity-broadening.ts';
import type { Estimate } from './posterior-estimate.ts';
import type { PpmRange } from './spectrum-question.ts';

/** What one spectrum says to a question: numbers with their posteriors, and everything a verdict needs. No verdicts here. */
export interface SpectrumAnswer {
  readonly noise: NoiseEstimate;
  readonly firstSampleIndex: number;
  readonly reference: ReferenceAnswer;
  readonly phaseRadians: Estimate;
  readonly timeZeroSamples: Estimate;
  readonly commonOffsetPpm: Estimate;
  /** Size of the model error: posterior mean and sd of eps, and the scale of its half-Cauchy prior. */
  readonly discrepancy: { readonly mean: number; readonly sd: number; readonly priorScale: number };
  readonly compounds: readonly CompoundAnswer[];
  readonly windows: readonly WindowAnswer[];
  readonly unexplained: readonly UnexplainedAnswer[];
  readonly intensityBroadening: IntensityBroadening | undefined;
  readonly search: SearchAnswer;
}

export interface ReferenceAnswer {
  readonly isAsked: boolean;
  readonly isFound: boolean;
  readonly trouble: string;
  readonly signalToNoise: number;
  readonly frequencyHz: number;
  readonly linewidthHz: number;
  /** Signal of one proton at time zero. */
  readonly amplitude: number;
  /** The reference fitted by itself, with the satellites of rare isotopes in the model. */
  readonly amplitudeWithSatellites: number;
  /** The same with the satellites of rare isotopes left out of the model; equal where it has none. */
  readonly amplitudeWithoutSatellites: number;
}

export interface CompoundAnswer {
  readonly id: string;
  /** log of (evidence with the compound / without it), nats; the amount's prior is normal about 0. */
  readonly logBayesFactor: number;
  readonly amountPriorSd: number;
  /** Signal of one proton at time zero. */
  readonly amount: Estimate;
  /** The amount over that of the reference; undefined without one. */
  readonly amountOverReference: Estimate | undefined;
  /** 95 % upper limit of the amount, given only where the compound is not plainly there; and over the reference. */
  readonly upperLimit: number | undefined;
  readonly upperLimitOverReference: number | undefined;
  readonly spinSystems: readonly SpinSystemAnswer[];
}

export interface SpinSystemAnswer {
  readonly label: string;
  readonly groups: readonly GroupAnswer[];
  readonly couplings: readonly CouplingAnswer[];
  /** Labels of couplings that no spectrum can tell apart. */
  readonly exchangeable: readonly (readonly string[])[];
}

export interface GroupAnswer {
  readonly label: string;
  readonly protonCount: number;
  readonly shiftPpm: Estimate;
  /** Shift less prior mean and common offset, in prior sd. */
  readonly shiftPullSd: number;
  readonly linewidthHz: Estimate;
  /** Signal per proton over the mean of the compound's groups; undefined for a single group. */
  readonly ratio: Estimate | undefined;
}

export interface CouplingAnswer {
  readonly label: string;
  readonly couplingHz: Estimate;
  readonly pullSd: number;
}

export interface WindowAnswer extends PpmRange {
  readonly binCount: number;
  readonly baselineTermCount: number;
  readonly residualFraction: number;
  readonly reducedChiSquare: number;
}

export interface UnexplainedAnswer extends PpmRange {
  readonly significanceSigma: number;
}

export interface SearchAnswer {
  readonly isAgreed: boolean;
  readonly isConverged: boolean;
  readonly populationCount: number;
  readonly startCount: number;
  readonly evaluationCount: number;
  /** Weights of the modes that share the posterior, best first. */
  readonly modeWeights: readonly number[];
}
