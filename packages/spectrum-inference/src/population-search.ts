import type { RandomStream } from '@spinassay/numerics';
import { createRandomStream } from '@spinassay/numerics';
import type { WindowRange } from './bin-windows.ts';
import { proposeMove } from './discrete-moves.ts';
import type { ParameterLayout } from './parameter-layout.ts';
import { alignPhase, fitRung, type RungContext } from './rung-fit.ts';
import { isSameMode } from './same-mode.ts';
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
/** Modes further than this behind the best are dropped, nats (INFERENCE step 7). */
const MODE_DEPTH = 15;

/** How many members go on from a rung, and how many of them are tried with a discrete move (INFERENCE, search step 5). */
function selectionAt(softWindowPerSecond: number): { kept: number; varied: number } {
  if (softWindowPerSecond > 10) return { kept: MEMBER_COUNT, varied: 0 };
  if (softWindowPerSecond > 1) return { kept: 3, varied: 3 };
  return { kept: 2, varied: 1 };
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
  const { layout } = request.context.model;
  const modes: FoundMode[] = [];
  let evaluationCount = 0;
  let population = 0;
  let isAgreed = false;
  while (population < POPULATIONS_MIN || (!isAgreed && population < POPULATIONS_MAX)) {
    const outcome = runPopulation(request, population, (fraction) => {
      if (hooks.isCancelled()) throw new SearchCancelled('the search was cancelled');
      hooks.onProgress(Math.min(1, (population + fraction) / POPULATIONS_MIN));
    });
    evaluationCount += outcome.evaluationCount;
    const claimed = new Set<FoundMode>();
    for (const member of outcome.members) {
      const known = modes.find((mode) => isSameMode(layout, mode, member));
      if (known === undefined) {
        const mode = { ...member, populationCount: 1 };
        modes.push(mode);
        claimed.add(mode);
      } else if (!claimed.has(known)) {
        known.populationCount += 1;
        claimed.add(known);
      }
    }
    modes.sort((a, b) => a.score - b.score);
    population += 1;
    isAgreed = (modes.at(0)?.populationCount ?? 0) >= 2;
  }
  const best = modes[0].score;
  return {
    modes: modes.filter((mode) => mode.score < best + MODE_DEPTH),
    isAgreed,
    populationCount: population,
    startCount: population * MEMBER_COUNT,
    evaluationCount,
  };
}

interface Member {
  readonly standardised: Float64Array;
  readonly amounts: Float64Array;
  readonly score: number;
}

function runPopulation(
  request: SearchRequest,
  population: number,
  onStep: (fraction: number) => void,
): { members: Member[]; evaluationCount: number } {
  const { context, signal } = request;
  const { layout } = context.model;
  const stream = (purpose: string, member: number): RandomStream =>
    createRandomStream({ seed: request.seed, purpose, population, member });
  let evaluationCount = 0;
  let starts = Array.from({ length: MEMBER_COUNT }, (_, m) =>
    population === 0 && m === 0
      ? new Float64Array(layout.parameters.length)
      : drawFromPrior(layout, stream('start', m)),
  );
  let members: Member[] = [];
  ROUTINE_LADDER_PER_SECOND.forEach((softWindow, rung) => {
    const bins = rungBins(signal, softWindow, request.rangesAt(softWindow), searchLineWeightMin(softWindow));
    const fit = (start: Float64Array): Member => {
      const result = fitRung(context, bins, start);
      evaluationCount += result.evaluationCount;
      return result;
    };
    members = starts.map((start, m) => {
      onStep((rung + m / starts.length) / ROUTINE_LADDER_PER_SECOND.length);
      return fit(rung === 0 && !request.isPhaseKnown ? alignPhase(context, bins, start) : start);
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
  return { members, evaluationCount };
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
