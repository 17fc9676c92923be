import type { CompoundQuestion, NormalPrior, SpectrumQuestion } from './spectrum-question.ts';

export type ParameterKind =
  | 'common-offset'
  | 'reference-position'
  | 'phase'
  | 'time-zero'
  | 'intensity-broadening'
  | 'shift'
  | 'log-decay'
  | 'response'
  | 'coupling';

/**
 * One nonlinear parameter. The search works on (value - mean) / unit.
 *
 * Units of the value: common-offset and shift ppm, reference-position Hz, phase radians, time-zero samples,
 * intensity-broadening 1/s at the strongest line, log-decay ln(1/s), response none, coupling Hz.
 */
export interface Parameter {
  readonly kind: ParameterKind;
  readonly mean: number;
  /** Scale of the search; the prior sd, but for responses (see `responseVariance`). */
  readonly unit: number;
  /** Prior variance of the value apart from lineshape; Infinity is a flat prior. */
  readonly variance: number;
  /** Place of the compound, the system in it, and the group or coupling in that; -1 where it has none. */
  readonly compound: number;
  readonly system: number;
  readonly item: number;
}

/** Where each parameter of each system stands in the vector. */
export interface SystemPlaces {
  /** First of groupCount shifts, log-decays and responses, and of couplingCount couplings; -1: absent. */
  readonly shift: number;
  readonly logDecay: number;
  readonly response: number;
  readonly coupling: number;
}

export interface ParameterLayout {
  readonly parameters: readonly Parameter[];
  readonly compounds: readonly CompoundQuestion[];
  /** [compound][system] */
  readonly places: readonly (readonly SystemPlaces[])[];
  readonly commonOffset: number;
  readonly referencePosition: number;
  readonly phase: number;
  readonly timeZero: number;
  readonly intensityBroadening: number;
  /** Index of the reference among `compounds`, -1 without one. */
  readonly referenceIndex: number;
  readonly hertzPerPpm: number;
  /** Declared place of 0 ppm, Hz from the carrier: used where no reference line was found. */
  readonly declaredZeroHz: number;
}

/** What was learnt before the joint fit and enters as prior. */
export interface LayoutPriors {
  readonly referencePositionHz: NormalPrior;
  readonly phaseRadians: NormalPrior;
  readonly timeZeroSamples: NormalPrior;
  readonly logDecay: NormalPrior;
  readonly withIntensityBroadening: boolean;
}

/** Prior sd of the excess decay of the strongest line, 1/s; REAL-DATA step 8 measured 1 to 2 in concentrated samples. */
const INTENSITY_BROADENING_SD = 2;
/** Search scale of a response factor whose prior is narrower than this. */
const RESPONSE_UNIT_MIN = 0.01;

/** Lay out the parameters of a question: the reference first (if any), then each compound in order. */
export function createParameterLayout(
  question: Pick<SpectrumQuestion, 'compounds' | 'reference' | 'commonOffsetSdPpm' | 'carrierPpm' | 'hertzPerPpm'>,
  priors: LayoutPriors,
): ParameterLayout {
  const compounds = [...(question.reference === undefined ? [] : [question.reference]), ...question.compounds];
  const referenceIndex = question.reference === undefined ? -1 : 0;
  const parameters: Parameter[] = [];
  const add = (kind: ParameterKind, prior: NormalPrior, place: [number, number, number] = [-1, -1, -1]): number => {
    const unit = kind === 'response' ? Math.max(prior.sd, RESPONSE_UNIT_MIN) : Number.isFinite(prior.sd) ? prior.sd : 1;
    const [compound, system, item] = place;
    return parameters.push({ kind, mean: prior.mean, unit, variance: prior.sd * prior.sd, compound, system, item }) - 1;
  };
  const commonOffset = add('common-offset', { mean: 0, sd: question.commonOffsetSdPpm });
  const referencePosition = referenceIndex < 0 ? -1 : add('reference-position', priors.referencePositionHz);
  const phase = add('phase', priors.phaseRadians);
  const timeZero = add('time-zero', priors.timeZeroSamples);
  const intensityBroadening = priors.withIntensityBroadening
    ? add('intensity-broadening', { mean: 0, sd: INTENSITY_BROADENING_SD })
    : -1;
  const places = compounds.map((compound, c) =>
    compound.spinSystems.map((system, s) => {
      const isReference = c === referenceIndex;
      const first = <T>(items: readonly T[], kind: ParameterKind, prior: (item: T) => NormalPrior): number => {
        const start = parameters.length;
        items.forEach((item, i) => {
          add(kind, prior(item), [c, s, i]);
        });
        return start;
      };
      return {
        shift: isReference ? -1 : first(system.groups, 'shift', (group) => group.shiftPpm),
        logDecay: first(system.groups, 'log-decay', () => priors.logDecay),
        response: first(system.groups, 'response', (group) => group.responseFactor),
        coupling: first(system.couplings, 'coupling', (coupling) => coupling.couplingHz),
      };
    }),
  );
  return {
    parameters,
    compounds,
    places,
    commonOffset,
    referencePosition,
    phase,
    timeZero,
    intensityBroadening,
    referenceIndex,
    hertzPerPpm: question.hertzPerPpm,
    declaredZeroHz: -question.carrierPpm * question.hertzPerPpm,
  };
}

/** The values behind a vector of standardised parameters. */
export function parameterValues(layout: ParameterLayout, standardised: Float64Array): Float64Array {
  return standardised.map((t, p) => layout.parameters[p].mean + layout.parameters[p].unit * t);
}

/**
 * Prior precision of each standardised parameter.
 *
 * A lineshape error of relative size eps may change the area of a whole multiplet by as much, unseen in the residual: it
 * adds eps^2 to the variance of every response factor (common practice, no source).
 */
export function priorPrecision(layout: ParameterLayout, eps: number): Float64Array {
  return Float64Array.from(layout.parameters, (parameter) => {
    const variance = parameter.variance + (parameter.kind === 'response' ? eps * eps : 0);
    return variance > 0 ? (parameter.unit * parameter.unit) / variance : Number.POSITIVE_INFINITY;
  });
}
