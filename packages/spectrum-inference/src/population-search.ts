import type { RandomStream } from '@spinassay/numerics';
import { createRandomStream } from '@spinassay/numerics';
import type { WindowRange } from './bin-windows.ts';
import { proposeMove } from './discrete-moves.ts';
import { type ParameterLayout, parameterValues } from './parameter-layout.ts';
import { repairMoves } from './repair-moves.ts';
import { alignPhase, fitRung, type RungContext, scoreOnBins } from './rung-fit.ts';
import { isSameMode } from './same-mode.ts';
import { intersectRanges, windowsRoundLines } from './search-windows.ts';
import { ROUTINE_LADDER_PER_SECOND, rungBins, searchLineWeightMin, type UsableSignal } from './time-ladder.ts';

/** A search that may be watched and stopped between steps. */
export interface SearchHooks {
  isCancelled(): boolean;
  onProgress(fraction: number): void;
}

export interface SearchRequest {
  readonly context: RungContext;
  readonly signal: UsableSignal;
  rangesAt(softWindowPerSecond: number): readonly WindowRange[];
  readonly seed: bigint;
  readonly isPhaseKnown: boolean;
}

/** One explanation found, with the independent populations that ended in it. */
export interface FoundMode {
  readonly standardised: Float64Array;
  readonly amounts: Float64Array;
  readonly score: number;
  populationCount: number;
}

export interface SearchReport {
  /** Best first; never empty. */
  readonly modes: readonly FoundMode[];
  /** True when two independent populations ended in the best mode. */
  readonly isAgreed: boolean;
  readonly populationCount: number;
  readonly startCount: number;
  readonly evaluationCount: number;
}

/** Members of a population; populations until two agree. */
const MEMBER_COUNT = 5;
const POPULATIONS_MIN = 2;
const POPULATIONS_MAX = 5;
/** Members that a population hands on. */
const KEPT_AT_END = 3;
/** Rounds of discrete changes on an ever better member, and what one must gain, nats: exchangeable labels gain nothing. */
const REPAIR_ROUNDS_MAX = 3;
const REPAIR_GAIN_MIN = 0.5;
/** Rungs from here down look at narrowed windows; these reach this far about lines of at least this weight, in protons. */
const NARROW_FROM_PER_SECOND = 3;
const NARROW_MARGIN_HZ = 25;
const NARROW_LINE_WEIGHT_MIN = 0.01;
/** Modes further than this behind the best are dropped, nats (INFERENCE step 7). */
const MODE_DEPTH = 15;

/** How many members go on from a rung, and how many of them are tried with a discrete move (INFERENCE, search step 5). */
function selectionAt(softWindowPerSecond: number): { kept: number; varied: number } {
  if (softWindowPerSecond > 10) return { kept: MEMBER_COUNT, varied: 0 };
  if (softWindowPerSecond > 1) return { kept: 3, varied: 3 };
  return { kept: 2, varied: 0 };
}

/** Raised between two steps when the caller asked to stop. */
export class SearchCancelled extends Error {
  override readonly name = 'SearchCancelled';
}

/**
 * Go with the winners down the acquisition-time ladder, until two independent populations agree on the best mode.
 *
 * @source Aldous & Vazirani, FOCS 1994; Grassberger, Comput. Phys. Commun. 147 (2002) 64; INFERENCE.md
 */
export function searchModes(request: SearchRequest, hooks: SearchHooks): SearchReport {
  const effort: Effort = { evaluationCount: 0 };
  const ends: { member: Member; population: number }[] = [];
  let modes: FoundMode[] = [];
  let population = 0;
  let isAgreed = false;
  while (population < POPULATIONS_MIN || (!isAgreed && population < POPULATIONS_MAX)) {
    const members = runPopulation(request, population, effort, (fraction) => {
      if (hooks.isCancelled()) throw new SearchCancelled('the search was cancelled');
      hooks.onProgress(Math.min(1, (population + fraction) / POPULATIONS_MIN));
    });
    for (const member of members) ends.push({ member, population });
    modes = gatherModes(request, ends);
    effort.evaluationCount += ends.length;
    population += 1;
    isAgreed = modes[0].populationCount >= 2;
  }
  const best = modes[0].score;
  return {
    modes: modes.filter((mode) => mode.score < best + MODE_DEPTH),
    isAgreed,
    populationCount: population,
    startCount: population * MEMBER_COUNT,
    evaluationCount: effort.evaluationCount,
  };
}

interface Member {
  readonly standardised: Float64Array;
  readonly amounts: Float64Array;
  readonly score: number;
}

/** Ends of all populations, scored on the same bins, as distinct modes, best first. */
function gatherModes(request: SearchRequest, ends: readonly { member: Member; population: number }[]): FoundMode[] {
  const { context, signal } = request;
  const everyone = ends.map(({ member }) => member);
  const bins = rungBins(signal, 0, narrowedRanges(request, 0, everyone), searchLineWeightMin(0));
  const scored = ends.map(({ member, population }) => ({
    ...member,
    population,
    score: scoreOnBins(context, bins, member.standardised),
  }));
  scored.sort((a, b) => a.score - b.score);
  const modes: (FoundMode & { populations: Set<number> })[] = [];
  for (const { population, ...end } of scored) {
    const known = modes.find((mode) => isSameMode(context.model.layout, mode, end));
    if (known === undefined) modes.push({ ...end, populations: new Set([population]), populationCount: 1 });
    else {
      known.populations.add(population);
      known.populationCount = known.populations.size;
    }
  }
  return modes.map(({ populations: _, ...mode }) => mode);
}

/** Counts evaluations over a search. */
interface Effort {
  evaluationCount: number;
}

/** Fits one start on one rung; the widest lines of the ladder are cut once a rung. */
type FitOnRung = (start: Float64Array) => Member;

function rungFitter(
  request: SearchRequest,
  softWindow: number,
  ranges: readonly WindowRange[],
  effort: Effort,
): FitOnRung {
  const bins = rungBins(request.signal, softWindow, ranges, searchLineWeightMin(softWindow));
  const isFirst = softWindow === ROUTINE_LADDER_PER_SECOND[0];
  return (start) => {
    const aligned = isFirst && !request.isPhaseKnown ? alignPhase(request.context, bins, start) : start;
    const result = fitRung(request.context, bins, aligned);
    effort.evaluationCount += result.evaluationCount;
    return result;
  };
}

function runPopulation(
  request: SearchRequest,
  population: number,
  effort: Effort,
  onStep: (fraction: number) => void,
): Member[] {
  const { layout } = request.context.model;
  const stream = (purpose: string, member: number): RandomStream =>
    createRandomStream({ seed: request.seed, purpose, population, member });
  let members: Member[] = [];
  let starts = Array.from({ length: MEMBER_COUNT }, (_, m) =>
    population === 0 && m === 0
      ? new Float64Array(layout.parameters.length)
      : drawFromPrior(layout, stream('start', m)),
  );
  ROUTINE_LADDER_PER_SECOND.forEach((softWindow, rung) => {
    const fit = rungFitter(request, softWindow, rangesOf(request, softWindow, members), effort);
    members = starts.map((start, m) => {
      onStep((rung + m / starts.length) / ROUTINE_LADDER_PER_SECOND.length);
      return fit(start);
    });
    const { kept, varied } = selectionAt(softWindow);
    if (kept < MEMBER_COUNT) {
      members = distinctBest(layout, members, kept);
      const moves = stream(`move-${rung}`, 0);
      const tried = members.slice(0, varied).map((member) => fit(proposeMove(layout, member.standardised, moves)));
      members = distinctBest(layout, [...members, ...tried], kept);
    }
    starts = members.map((member) => member.standardised);
  });
  return repaired(request, members, effort, onStep);
}

/**
 * Try, one after the other, every discrete change of the best member that its priors allow, whether or not a residual shows:
 * single signs and permutations leave next to none (SEARCH section 1).
 */
function repaired(
  request: SearchRequest,
  members: readonly Member[],
  effort: Effort,
  onStep: (fraction: number) => void,
): Member[] {
  const { layout } = request.context.model;
  const narrow = rungFitter(request, 0, narrowedRanges(request, 0, members), effort);
  let best = narrow(members[0].standardised);
  for (let round = 0; round < REPAIR_ROUNDS_MAX; round += 1) {
    const before = best;
    for (const change of repairMoves(layout, before.standardised)) {
      onStep(1);
      const changed = narrow(change);
      if (changed.score < best.score - REPAIR_GAIN_MIN) best = changed;
    }
    if (best === before) return [...members];
  }
  const found = [...members, best];
  return distinctBest(layout, found, KEPT_AT_END);
}

/**
 * Windows of a rung. While members are apart the whole prior range is looked at; from 3 per second on the surroundings of where
 * any of them stands are enough to sharpen and compare them.
 */
function rangesOf({ context, rangesAt }: SearchRequest, softWindow: number, members: readonly Member[]): WindowRange[] {
  if (softWindow > NARROW_FROM_PER_SECOND || members.length === 0) return [...rangesAt(softWindow)];
  return narrowedRanges({ context, rangesAt }, softWindow, members);
}

function narrowedRanges(
  { context, rangesAt }: Pick<SearchRequest, 'context' | 'rangesAt'>,
  softWindow: number,
  members: readonly Member[],
): WindowRange[] {
  const { layout } = context.model;
  const near = members.flatMap((member) =>
    context.model
      .dampedLines(parameterValues(layout, member.standardised))
      .filter((line) => Math.abs(line.weight) > NARROW_LINE_WEIGHT_MIN)
      .map((line) => line.frequencyHz),
  );
  return intersectRanges(windowsRoundLines(near, NARROW_MARGIN_HZ, layout.hertzPerPpm), rangesAt(softWindow));
}

function distinctBest(layout: ParameterLayout, members: readonly Member[], count: number): Member[] {
  const kept: Member[] = [];
  for (const member of [...members].sort((a, b) => a.score - b.score)) {
    if (kept.length < count && !kept.some((other) => isSameMode(layout, other, member))) kept.push(member);
  }
  return kept;
}

/** Shifts, couplings and the common offset from their priors; the rest at its mean. */
function drawFromPrior(layout: ParameterLayout, random: RandomStream): Float64Array {
  return Float64Array.from(layout.parameters, ({ kind }) => {
    const draw = random.nextNormal();
    return kind === 'shift' || kind === 'coupling' || kind === 'common-offset' ? draw : 0;
  });
}
