import { logSumExp } from '@spinassay/numerics';
import type { BinWindows } from './bin-windows.ts';
import { coarseEpsGrid, ENVELOPE_SD_GRID, fineEpsGrid, logEpsMass } from './discrepancy-grids.ts';
import { type FitPlace, type LinearisedFit, linearise, modelOf } from './linearised-fit.ts';
import { createProportionalWhitener, localModelMagnitude, type ProportionalNoise } from './noise-whitener.ts';
import { type GramSystem, gramSystem, type NormalPosterior, normalPosterior } from './normal-posterior.ts';
import { priorPrecision } from './parameter-layout.ts';
import type { RungContext } from './rung-fit.ts';
import { ENVELOPE_COLUMN_COUNT } from './shared-envelope.ts';
import { evaluateFit } from './spectrum-fit.ts';

/** Posterior of one mode, as a mixture of normals over the sizes of model error (eps) and shared envelope. */
export interface DiscrepancyPosterior {
  readonly fit: LinearisedFit;
  readonly noise: ProportionalNoise;
  readonly components: readonly SizeComponent[];
  /** log of the evidence of this mode with the sizes integrated, nats. */
  readonly logEvidence: number;
  readonly epsMean: number;
  readonly epsSd: number;
  readonly envelopeSdMean: number;
  readonly converged: boolean;
  readonly evaluationCount: number;
}

export interface SizeComponent {
  readonly eps: number;
  readonly envelopeSd: number;
  /** Posterior weight; they sum to 1. */
  readonly weight: number;
  readonly posterior: NormalPosterior;
}

/** eps assumed before it is judged. */
const START_EPS = 0.05;
/** Rounds of judging the sizes and stepping to the mode they give. */
const ROUNDS_MAX = 16;
/** Rounds end when a Newton step would gain less than this, nats; the mode counts as found below the second figure. */
const SETTLED_GAIN = 0.05;
const CONVERGED_GAIN = 0.5;
/** Longest step of one standardised parameter a round. */
const STEP_MAX = 1;
/** Components of less weight say nothing. */
const WEIGHT_MIN = 1e-6;

/**
 * The posterior about a mode with the sizes of model error and envelope integrated.
 *
 * Each round judges both sizes by their marginal likelihood on the model linearised where it stands (INTERVALS section 3:
 * grids, since expectation-maximisation is far too slow toward zero), steps to the mode they give, and linearises again.
 *
 * @param start standardised parameters of a mode of the search at the end of the ladder
 */
export function discrepancyPosterior(
  context: RungContext,
  bins: BinWindows,
  start: Float64Array,
): DiscrepancyPosterior {
  const linear = (place: FitPlace): LinearisedFit => linearise(context.model, bins, context.signal, place);
  let fit = linear(firstPlace(context, bins, start));
  let judged = judge(context, fit, judgedSystems(context, fit, [START_EPS]));
  let evaluationCount = 2;
  let gain = Number.POSITIVE_INFINITY;
  for (let round = 0; round < ROUNDS_MAX && gain > SETTLED_GAIN; round += 1) {
    fit = linear(stepped(fit, judged.top.posterior));
    judged = judge(context, fit, judgedSystems(context, fit, coarseEpsGrid()));
    evaluationCount += 1;
    gain = gainOf(judged.top.posterior);
  }
  const fine = judgedSystems(context, fit, fineEpsGrid(judged.top.eps));
  judged = judge(context, fit, { ...fine, systems: [...judged.systems, ...fine.systems] });
  const { components, logEvidence, noise } = judged;
  const mean = (of: (component: SizeComponent) => number): number =>
    components.reduce((sum, c) => sum + c.weight * of(c), 0);
  const epsMean = mean((c) => c.eps);
  return {
    fit,
    noise,
    components,
    logEvidence,
    epsMean,
    epsSd: Math.sqrt(mean((c) => (c.eps - epsMean) * (c.eps - epsMean))),
    envelopeSdMean: mean((c) => c.envelopeSd),
    converged: gain < CONVERGED_GAIN,
    evaluationCount,
  };
}

interface Judged extends JudgedSystems {
  readonly components: readonly SizeComponent[];
  readonly top: SizeComponent;
  readonly logEvidence: number;
}

/** Amounts at the start under white noise; no envelope. */
function firstPlace(context: RungContext, bins: BinWindows, start: Float64Array): FitPlace {
  const white = { noiseSd: context.noiseSd, localModel: new Float64Array(bins.binCount) };
  const { amounts } = evaluateFit(
    {
      model: context.model,
      bins,
      whitener: createProportionalWhitener(bins, white, 0),
      precision: priorPrecision(context.model.layout, START_EPS),
      amountSd: context.amountSd,
    },
    start,
  );
  return { standardised: start, amounts, envelope: new Float64Array(ENVELOPE_COLUMN_COUNT) };
}

interface JudgedSystems {
  readonly noise: ProportionalNoise;
  readonly systems: readonly GramSystem[];
}

function judgedSystems(context: RungContext, fit: LinearisedFit, grid: readonly number[]): JudgedSystems {
  const noise = { noiseSd: context.noiseSd, localModel: localModelMagnitude(fit.bins, modelOf(fit)) };
  return { noise, systems: grid.map((eps) => gramSystem(fit, noise, eps)) };
}

/** Weigh both sizes on the grid of eps that the systems stand for. */
function judge({ amountSd }: RungContext, fit: LinearisedFit, judged: JudgedSystems): Judged {
  const systems = [...judged.systems].sort((a, b) => a.eps - b.eps);
  const epsMass = logEpsMass(systems.map((system) => system.eps));
  const points = systems.flatMap((system, i) =>
    ENVELOPE_SD_GRID.map(({ sd, logMass }) => {
      const posterior = normalPosterior(fit, system, { amountSd, envelopeSd: sd, without: [] });
      const logWeight = posterior.logEvidence + epsMass[i] + logMass;
      return { eps: system.eps, envelopeSd: sd, posterior, logWeight };
    }),
  );
  const logEvidence = logSumExp(Float64Array.from(points, ({ logWeight }) => logWeight));
  const components = points
    .map(({ logWeight, ...point }) => ({ ...point, weight: Math.exp(logWeight - logEvidence) }))
    .filter((component) => component.weight > WEIGHT_MIN);
  const top = components.reduce((a, b) => (b.weight > a.weight ? b : a));
  return { ...judged, systems, components, top, logEvidence };
}

/** The place the posterior's step leads to, shortened where it leaves the reach of the linear model. */
function stepped(fit: LinearisedFit, { indices, step }: NormalPosterior): FitPlace {
  const parameterCount = fit.standardised.length;
  const place = Float64Array.of(...fit.standardised, ...fit.amounts, ...fit.envelope);
  let longest = 0;
  indices.forEach((index, i) => {
    if (index < parameterCount) longest = Math.max(longest, Math.abs(step[i]));
  });
  const scale = longest > STEP_MAX ? STEP_MAX / longest : 1;
  indices.forEach((index, i) => {
    place[index] += scale * step[i];
  });
  // Entries that are not free stay, but for an envelope that was judged not to be there.
  const isFree = new Set(indices);
  for (let e = parameterCount + fit.amounts.length; e < place.length; e += 1) if (!isFree.has(e)) place[e] = 0;
  return {
    standardised: place.slice(0, parameterCount),
    amounts: place.slice(parameterCount, parameterCount + fit.amounts.length),
    envelope: place.slice(parameterCount + fit.amounts.length),
  };
}

/** What the step to the mean gains, nats: half of step' precision step. */
function gainOf({ step, factor }: NormalPosterior): number {
  const size = step.length;
  let gain = 0;
  for (let j = 0; j < size; j += 1) {
    let sum = 0;
    for (let i = j; i < size; i += 1) sum += factor[i * size + j] * step[i];
    gain += 0.5 * sum * sum;
  }
  return gain;
}
