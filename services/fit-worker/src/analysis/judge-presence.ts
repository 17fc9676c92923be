import type { Verdict } from '@spinassay/contract';
import type { CompoundAnswer, SpectrumAnswer } from '@spinassay/spectrum-inference';

/** Log Bayes factors, nats: plainly there, and rather absent (common practice; measured false alarms come with the blanks). */
const PRESENT_LOG_BAYES = 5;
const ABSENT_LOG_BAYES = 0;
/** A shift or coupling this many prior sd away is another compound's (REAL-DATA section 8, rule ii). */
const PULL_MAX_SD = 3;
/** Groups whose signal per proton is outside this range are not one compound (REAL-DATA section 8, rule i). */
const RATIO_RANGE = [0.85, 1.15] as const;

/** Is the compound there? Strong evidence for *something* at its place is not enough: it must look like the compound. */
export function judgePresence(compound: CompoundAnswer, answer: SpectrumAnswer, residualFractionMax: number): Verdict {
  if (compound.logBayesFactor < ABSENT_LOG_BAYES || !(compound.amount.value > 0)) return 'not-supported';
  if (compound.logBayesFactor < PRESENT_LOG_BAYES) return 'cannot-tell';
  return looksLikeItself(compound) && isExplainedWhereItStands(compound, answer, residualFractionMax)
    ? 'supported'
    : 'cannot-tell';
}

function looksLikeItself(compound: CompoundAnswer): boolean {
  return compound.spinSystems.every(
    (system) =>
      system.couplings.every((coupling) => Math.abs(coupling.pullSd) <= PULL_MAX_SD) &&
      system.groups.every(
        ({ ratio, shiftPullSd }) =>
          Math.abs(shiftPullSd) <= PULL_MAX_SD &&
          (ratio === undefined || (ratio.value >= RATIO_RANGE[0] && ratio.value <= RATIO_RANGE[1])),
      ),
  );
}

function isExplainedWhereItStands(
  compound: CompoundAnswer,
  answer: SpectrumAnswer,
  residualFractionMax: number,
): boolean {
  const shifts = compound.spinSystems.flatMap((system) => system.groups.map((group) => group.shiftPpm.value));
  return answer.windows.every(
    (window) =>
      window.residualFraction <= residualFractionMax ||
      isNoise(window.reducedChiSquare) ||
      !shifts.some((shift) => shift >= window.lowPpm && shift <= window.highPpm),
  );
}

/** A residual of about the noise is no misfit, however large a share of a weak signal it is. */
export function isNoise(reducedChiSquare: number): boolean {
  return reducedChiSquare < NOISE_CHI_SQUARE;
}

/** Windows have 100 degrees of freedom and more: 1.5 is 3.5 sd of a reduced chi-square of 100. */
const NOISE_CHI_SQUARE = 1.5;
