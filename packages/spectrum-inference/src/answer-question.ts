import { createFourierPlan, DomainError } from '@spinassay/numerics';
import { estimateNoise, type NoiseEstimate, type TaperedSpectrum, taperedSpectrum } from '@spinassay/signal-processing';
import type { BinWindows, WindowRange } from './bin-windows.ts';
import { compoundAnswers, scalarEstimates } from './compound-answers.ts';
import { EPS_PRIOR_SCALE } from './discrepancy-grids.ts';
import { fitReference, type ReferenceFit, TIME_ZERO_SD_SAMPLES, UNKNOWN_LOG_DECAY } from './fit-reference.ts';
import { intensityBroadening } from './intensity-broadening.ts';
import { type LocatedReference, locateReference } from './locate-reference.ts';
import { logBayesFactors, weighModes } from './mode-posterior.ts';
import { modelSignal } from './model-signal.ts';
import { createParameterLayout, type LayoutPriors, parameterValues } from './parameter-layout.ts';
import { type SearchHooks, type SearchReport, searchModes } from './population-search.ts';
import type { WeightedMode } from './posterior-estimate.ts';
import type { RungContext } from './rung-fit.ts';
import { searchWindows, windowsRoundLines } from './search-windows.ts';
import { applyEnvelopeInPlace } from './shared-envelope.ts';
import type { ReferenceAnswer, SpectrumAnswer, UnexplainedAnswer } from './spectrum-answer.ts';
import { createSpectrumModel } from './spectrum-model.ts';
import type { SpectrumQuestion } from './spectrum-question.ts';
import { rungBins, type UsableSignal } from './time-ladder.ts';
import { unexplainedRegions } from './unexplained-regions.ts';
import { windowResiduals } from './window-residuals.ts';

/** Samples after time zero that the digital filter spoils (REAL-DATA section 2). */
const FILTER_TRANSIENT_SAMPLES = 16;
/** Fewer usable samples than this carry no spectrum. */
const USABLE_SAMPLES_MIN = 256;
/** A decay about the reference line's, 30 % either way (REAL-DATA step 7). */
const LOG_DECAY_SD = 0.3;
const PHASE_SD_RADIANS = 0.1;
/** Log Bayes factor from which a compound's own lines decide the windows. */
const PLAINLY_PRESENT = 5;
/** Room about each line of a mode, in its full widths and at least in Hz. */
const LINE_MARGIN_WIDTHS = 10;
const LINE_MARGIN_HZ = 10;

/**
 * Infer the spin Hamiltonian, amounts and everything that goes with them from one FID.
 *
 * @throws DomainError when the signal is too short; SystemTooLargeError for a compound beyond the exact engine;
 *   SearchCancelled when the hooks say so
 */
export function answerQuestion(question: SpectrumQuestion, hooks: SearchHooks): SpectrumAnswer {
  const signal = usableSignal(question);
  const tapered = taperedSpectrum(signal.samples, signal.firstSampleIndex, signal.dwellSeconds);
  const noise = estimateNoise(tapered);
  const amountSd = largestAmount(signal);
  const reference = findReference(question, signal, tapered, noise, amountSd);
  const asked = { ...question, reference: reference.fit === undefined ? undefined : question.reference };
  const priors = priorsAfter(question, reference.fit);
  const layout = createParameterLayout(asked, priors);
  const context: RungContext = {
    model: createSpectrumModel(layout),
    noiseSd: noise.sdPerComponent,
    amountSd: new Float64Array(layout.compounds.length).fill(amountSd),
    signal,
  };
  const zeroHz = reference.fit?.frequencyHz ?? layout.declaredZeroHz;
  const referenceWindow =
    reference.fit === undefined ? [] : [{ lowPpm: -30 / question.hertzPerPpm, highPpm: 30 / question.hertzPerPpm }];
  const windowsAsked = question.windows.length === 0 ? [] : [...question.windows, ...referenceWindow];
  const rangesAt = (softWindow: number): WindowRange[] =>
    insideWidth(searchWindows(layout, windowsAsked, zeroHz, softWindow), question.dwellSeconds);
  const search = searchModes(
    { context, signal, rangesAt, seed: question.seed, isPhaseKnown: reference.fit !== undefined },
    hooks,
  );
  return conclude({ question: asked, priors, signal, noise, context, reference, search, zeroHz, rangesAt });
}

interface Findings {
  readonly question: SpectrumQuestion;
  readonly priors: LayoutPriors;
  readonly signal: UsableSignal;
  readonly noise: NoiseEstimate;
  readonly context: RungContext;
  readonly reference: FoundReference;
  readonly search: SearchReport;
  readonly zeroHz: number;
  rangesAt(softWindow: number): WindowRange[];
}

function conclude(findings: Findings): SpectrumAnswer {
  const { question, context, signal, search, noise, zeroHz } = findings;
  const { layout } = context.model;
  const wideBins = rungBins(signal, 0, findings.rangesAt(0));
  const isOwnWindows = question.windows.length > 0;
  // Where windows are narrowed afterwards, the whole range serves presence alone: the best mode is enough.
  const wide = weighModes(context, wideBins, isOwnWindows ? search.modes : search.modes.slice(0, 1));
  const wideLogBayes = logBayesFactors(context, wide);
  const present = layout.compounds.map(
    (_, c) => c === layout.referenceIndex || (wideLogBayes[c] ?? 0) > PLAINLY_PRESENT,
  );
  const isNarrowed = !isOwnWindows && present.some((is, c) => is && c !== layout.referenceIndex);
  const bins = isNarrowed ? narrowBins(findings, wide, present) : wideBins;
  const modes = isNarrowed ? weighModes(context, bins, search.modes) : wide;
  // Evidence must hold over the whole prior range and where the compound's own lines stand: elsewhere it may feed on a stranger.
  const ownLogBayes = isNarrowed ? logBayesFactors(context, modes) : wideLogBayes;
  const logBayes = wideLogBayes.map((value, c) => Math.min(value, ownLogBayes[c]));
  const best = modes[0].posterior;
  const toPpm = (hz: number): number => (hz - zeroHz) / question.hertzPerPpm;
  return {
    noise,
    firstSampleIndex: signal.firstSampleIndex,
    reference: referenceAnswer(findings, modes),
    ...scalarEstimates(layout, modes),
    discrepancy: { mean: best.epsMean, sd: best.epsSd, priorScale: EPS_PRIOR_SCALE },
    compounds: compoundAnswers({ context, bins: wideBins, modes, logBayes, seed: question.seed }),
    windows: windowResiduals(bins, best.fit.residual, noise.sdPerComponent).map(({ lowHz, highHz, ...rest }) => ({
      lowPpm: toPpm(lowHz),
      highPpm: toPpm(highHz),
      ...rest,
    })),
    unexplained: unexplained(
      findings,
      modes[0],
      present.map((is, c) => is && (c === layout.referenceIndex || logBayes[c] > PLAINLY_PRESENT)),
      toPpm,
    ),
    intensityBroadening: present.some((is, c) => is && c !== layout.referenceIndex)
      ? intensityBroadening(question, findings.priors, context, bins, best)
      : undefined,
    search: {
      isAgreed: search.isAgreed,
      isConverged: best.converged,
      populationCount: search.populationCount,
      startCount: search.startCount,
      evaluationCount: search.evaluationCount + modes.reduce((sum, mode) => sum + mode.posterior.evaluationCount, 0),
      modeWeights: modes.map((mode) => mode.weight),
    },
  };
}

function usableSignal(question: SpectrumQuestion): UsableSignal {
  const firstSampleIndex = Math.max(0, Math.floor(question.timeZeroSamples)) + FILTER_TRANSIENT_SAMPLES;
  const usable = question.samples.length / 2 - firstSampleIndex;
  if (usable < USABLE_SAMPLES_MIN) {
    throw new DomainError(
      `expected at least ${USABLE_SAMPLES_MIN} samples after the first ${firstSampleIndex}, got ${usable}`,
    );
  }
  return {
    samples: question.samples,
    dwellSeconds: question.dwellSeconds,
    firstSampleIndex,
    plan: createFourierPlan(usable),
  };
}

/** Prior sd of every amount: no proton can give more signal than the whole FID at its largest. */
function largestAmount({ samples, firstSampleIndex }: UsableSignal): number {
  let largest = 0;
  for (let n = 2 * firstSampleIndex; n < samples.length; n += 2) {
    largest = Math.max(largest, Math.hypot(samples[n], samples[n + 1]));
  }
  return largest;
}

interface FoundReference {
  readonly located: LocatedReference;
  readonly fit: ReferenceFit | undefined;
  readonly amplitudeWithoutSatellites: number;
}

function findReference(
  question: SpectrumQuestion,
  signal: UsableSignal,
  tapered: TaperedSpectrum,
  noise: NoiseEstimate,
  amountSd: number,
): FoundReference {
  const declaredZeroHz = -question.carrierPpm * question.hertzPerPpm;
  const located = locateReference(tapered, noise.sdPerComponent, declaredZeroHz, question.hertzPerPpm);
  if (question.reference === undefined || !located.isFound)
    return { located, fit: undefined, amplitudeWithoutSatellites: 0 };
  const at = { frequencyHz: located.frequencyHz, noiseSd: noise.sdPerComponent, amountSd };
  const bare = {
    ...question.reference,
    spinSystems: question.reference.spinSystems.map((system) => ({ ...system, satellites: [] })),
  };
  return {
    located,
    fit: fitReference(question, question.reference, signal, at),
    amplitudeWithoutSatellites: fitReference(question, bare, signal, at).amplitude,
  };
}

function priorsAfter(question: SpectrumQuestion, fit: ReferenceFit | undefined): LayoutPriors {
  return {
    referencePositionHz: { mean: fit?.frequencyHz ?? 0, sd: 1 },
    phaseRadians: { mean: fit?.phaseRadians ?? 0, sd: fit === undefined ? Number.POSITIVE_INFINITY : PHASE_SD_RADIANS },
    timeZeroSamples: { mean: question.timeZeroSamples, sd: TIME_ZERO_SD_SAMPLES },
    logDecay: fit === undefined ? UNKNOWN_LOG_DECAY : { mean: Math.log(fit.decayPerSecond), sd: LOG_DECAY_SD },
    withIntensityBroadening: false,
  };
}

function insideWidth(ranges: readonly WindowRange[], dwellSeconds: number): WindowRange[] {
  const edge = 0.49 / dwellSeconds;
  return ranges
    .map((range) => ({ ...range, lowHz: Math.max(-edge, range.lowHz), highHz: Math.min(edge, range.highHz) }))
    .filter((range) => range.highHz > range.lowHz);
}

function narrowBins(findings: Findings, modes: readonly WeightedMode[], present: readonly boolean[]): BinWindows {
  const { context, signal, question } = findings;
  const wide = findings.rangesAt(0);
  const frequencies: number[] = [];
  let margin = LINE_MARGIN_HZ;
  for (const { posterior } of modes) {
    for (const line of context.model.dampedLines(parameterValues(context.model.layout, posterior.fit.standardised))) {
      if (!present[line.compound] || Math.abs(line.weight) < 0.01) continue;
      frequencies.push(line.frequencyHz);
      margin = Math.max(margin, (LINE_MARGIN_WIDTHS * line.decayPerSecond) / Math.PI);
    }
  }
  const absent = wide.filter((range) => !frequencies.some((f) => f > range.lowHz && f < range.highHz));
  const ranges = [...windowsRoundLines(frequencies, Math.min(margin, 30), question.hertzPerPpm), ...absent];
  ranges.sort((a, b) => a.lowHz - b.lowHz);
  return rungBins(signal, 0, insideWidth(ranges, question.dwellSeconds));
}

function referenceAnswer({ question, reference, context }: Findings, modes: readonly WeightedMode[]): ReferenceAnswer {
  const { layout } = context.model;
  const { located, fit } = reference;
  const joint = layout.referenceIndex < 0 ? undefined : modes[0].posterior.fit;
  const values = joint === undefined ? undefined : parameterValues(layout, joint.standardised);
  const amplitude = joint?.amounts[layout.referenceIndex] ?? 0;
  return {
    isAsked: question.reference !== undefined || located.trouble !== '',
    isFound: fit !== undefined,
    trouble: located.trouble,
    signalToNoise: located.signalToNoise,
    frequencyHz: values?.[layout.referencePosition] ?? layout.declaredZeroHz,
    linewidthHz:
      values === undefined ? 0 : Math.exp(values[layout.places[layout.referenceIndex][0].logDecay]) / Math.PI,
    amplitude,
    amplitudeWithSatellites: fit?.amplitude ?? 0,
    amplitudeWithoutSatellites: reference.amplitudeWithoutSatellites,
  };
}

function unexplained(
  { question, context, signal, noise, zeroHz }: Findings,
  best: WeightedMode,
  present: readonly boolean[],
  toPpm: (hz: number) => number,
): UnexplainedAnswer[] {
  const { fit } = best.posterior;
  const amounts = fit.amounts.map((amount, c) => (present[c] ? amount : 0));
  const values = parameterValues(context.model.layout, fit.standardised);
  const model = modelSignal(context.model, values, amounts, {
    sampleCount: signal.samples.length / 2,
    dwellSeconds: signal.dwellSeconds,
  });
  applyEnvelopeInPlace(model, fit.envelope, values[context.model.layout.timeZero]);
  const residual = signal.samples.map((value, n) => value - model[n]);
  const excluded = question.excludedRegions.map((region) => [
    zeroHz + region.lowPpm * question.hertzPerPpm,
    zeroHz + region.highPpm * question.hertzPerPpm,
  ]);
  const at = { ...signal, noiseSd: noise.sdPerComponent };
  return unexplainedRegions(residual, model, at, (f) => excluded.some(([low, high]) => f >= low && f <= high)).map(
    ({ lowHz, highHz, significanceSigma }) => ({ lowPpm: toPpm(lowHz), highPpm: toPpm(highHz), significanceSigma }),
  );
}
