import { choleskyInto, choleskyLogDeterminant, choleskySolveInto } from '@spinassay/numerics';
import type { LinearisedFit } from './linearised-fit.ts';
import { createProportionalWhitener, type ProportionalNoise } from './noise-whitener.ts';
import { type ParameterLayout, priorPrecision } from './parameter-layout.ts';
import { ENVELOPE_COLUMN_COUNT } from './shared-envelope.ts';
import { dot } from './spectrum-fit.ts';

/** Inner products of a linearised fit under one noise model: all that any posterior under it needs. */
export interface GramSystem {
  readonly eps: number;
  /** (n x n) columns with columns, n = P + C + E. */
  readonly gram: Float64Array;
  /** (n) columns with the residual. */
  readonly projection: Float64Array;
  readonly residualSquare: number;
  readonly logDeterminant: number;
}

/** Whiten a fit for one eps. */
export function gramSystem(fit: LinearisedFit, noise: ProportionalNoise, eps: number): GramSystem {
  const whitener = createProportionalWhitener(fit.bins, noise, eps);
  const residual = fit.residual.slice();
  whitener.whitenInPlace(residual);
  const columns = fit.columns.map((column) => {
    const white = column.slice();
    whitener.whitenInPlace(white);
    return white;
  });
  const size = columns.length;
  const gram = new Float64Array(size * size);
  const projection = new Float64Array(size);
  for (let i = 0; i < size; i += 1) {
    projection[i] = dot(columns[i], residual);
    for (let j = 0; j <= i; j += 1) {
      gram[i * size + j] = dot(columns[i], columns[j]);
      gram[j * size + i] = gram[i * size + j];
    }
  }
  return { eps, gram, projection, residualSquare: dot(residual, residual), logDeterminant: whitener.logDeterminant };
}

/** Sizes of what is random, and which compounds the hypothesis leaves out. */
export interface Hypothesis {
  readonly amountSd: Float64Array;
  /** Prior sd of every envelope weight; 0: no envelope. */
  readonly envelopeSd: number;
  readonly without: readonly number[];
}

/** The normal posterior and the evidence of a linearised fit. */
export interface NormalPosterior {
  /** Entries of (P + C + E) that are free, in order; step and factor follow it. */
  readonly indices: readonly number[];
  /** Step from the place of linearisation to the mean. */
  readonly step: Float64Array;
  /** Cholesky factor of the precision, lower, row-major. */
  readonly factor: Float64Array;
  /** log of the marginal likelihood, nats; flat priors (baseline, free phase) leave a constant that every hypothesis shares. */
  readonly logEvidence: number;
}

/**
 * Posterior and evidence in closed form.
 *
 * Linear-Gaussian evidence: Bishop 2006 eq. 3.49-3.51; the baseline is marginalised by the whitener.
 */
export function normalPosterior(fit: LinearisedFit, system: GramSystem, hypothesis: Hypothesis): NormalPosterior {
  const place = Float64Array.of(...fit.standardised, ...fit.amounts, ...fit.envelope);
  const precision = fullPrecision(fit.layout, system.eps, hypothesis);
  const isFree = freeEntries(fit.layout, precision, hypothesis);
  const indices = [...place.keys()].filter((index) => isFree[index]);
  const gone = [...place.keys()].filter(
    (index) => !isFree[index] && index >= fit.layout.parameters.length && place[index] !== 0,
  );
  const { projection, residualSquare } = withoutEntries(system, place, gone);
  const size = indices.length;
  const full = place.length;
  const matrix = new Float64Array(size * size);
  const gradient = new Float64Array(size);
  let logPrior = 0;
  indices.forEach((index, i) => {
    for (let j = 0; j < size; j += 1) matrix[i * size + j] = system.gram[index * full + indices[j]];
    const weight = precision[index];
    const at = place[index];
    matrix[i * size + i] += weight;
    gradient[i] = projection[index] - weight * at;
    logPrior += -0.5 * weight * at * at + (weight > 0 ? 0.5 * Math.log(weight) : 0);
  });
  const factor = new Float64Array(size * size);
  choleskyInto(size, matrix, factor);
  const step = new Float64Array(size);
  choleskySolveInto(size, factor, gradient, step);
  const logEvidence =
    -0.5 * residualSquare +
    logPrior +
    0.5 * dot(gradient, step) -
    0.5 * choleskyLogDeterminant(size, factor) -
    0.5 * system.logDeterminant;
  return { indices, step, factor, logEvidence };
}

/** The residual's products with entries of the place put back to "not there". */
function withoutEntries(
  system: GramSystem,
  place: Float64Array,
  gone: readonly number[],
): { projection: Float64Array; residualSquare: number } {
  const size = place.length;
  const projection = system.projection.slice();
  let residualSquare = system.residualSquare;
  for (const a of gone) {
    residualSquare += 2 * place[a] * system.projection[a];
    for (const b of gone) residualSquare += place[a] * place[b] * system.gram[a * size + b];
    for (let i = 0; i < size; i += 1) projection[i] += place[a] * system.gram[a * size + i];
  }
  return { projection, residualSquare };
}

function fullPrecision(layout: ParameterLayout, eps: number, { amountSd, envelopeSd }: Hypothesis): Float64Array {
  const parameters = priorPrecision(layout, eps);
  const amounts = amountSd.map((sd) => 1 / (sd * sd));
  return Float64Array.of(
    ...parameters,
    ...amounts,
    ...new Float64Array(ENVELOPE_COLUMN_COUNT).fill(1 / (envelopeSd * envelopeSd)),
  );
}

/** Free are parameters with a width and whatever the hypothesis keeps. */
function freeEntries(layout: ParameterLayout, precision: Float64Array, { without, envelopeSd }: Hypothesis): boolean[] {
  const parameterCount = layout.parameters.length;
  const compoundCount = layout.compounds.length;
  return Array.from(precision, (weight, index) => {
    if (index < parameterCount) return Number.isFinite(weight) && !without.includes(layout.parameters[index].compound);
    if (index < parameterCount + compoundCount) return !without.includes(index - parameterCount);
    return envelopeSd > 0;
  });
}
