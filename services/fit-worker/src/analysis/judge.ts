import type { Reason, ResultBody, Verdict } from '@spinassay/contract';
import { methodDefaults } from '@spinassay/contract';
import type { SpectrumAnswer } from '@spinassay/spectrum-inference';
import type { AnalysisRequest } from './analysis-request.ts';
import { declarationReasons } from './declaration-reasons.ts';
import { judgePresence } from './judge-presence.ts';
import { spectrumReasons } from './spectrum-reasons.ts';

/** The verdicts on a whole spectrum, in words that carry their reasons. */
export interface Judgement {
  readonly explainsSpectrum: ResultBody['explainsSpectrum'];
  readonly recommendation: ResultBody['recommendation'];
  /** By compound id. */
  readonly presence: ReadonlyMap<string, Verdict>;
}

type Claim = 'shifts' | 'ratios' | 'amounts';

/** A reason with the claims it holds. */
export interface Holding {
  readonly reason: Reason;
  readonly holds: readonly Claim[];
}

export const ALL_CLAIMS: readonly Claim[] = ['shifts', 'ratios', 'amounts'];

/** Judge an answer by the method's limits. Reasons come in the order of weight: what spoils everything first. */
export function judge(request: AnalysisRequest, answer: SpectrumAnswer): Judgement {
  const residualFractionMax = request.method.acceptance?.residualFractionMax ?? methodDefaults.residualFractionMax;
  const spectrum = spectrumReasons(answer, residualFractionMax);
  const presence = new Map(
    answer.compounds.map((compound) => [compound.id, judgePresence(compound, answer, residualFractionMax)]),
  );
  const holdings = [
    ...spectrum,
    ...presenceReasons(request, answer, presence),
    ...groupReasons(request, answer, presence),
    ...declarationReasons(request, answer),
  ];
  const claims = request.method.claims;
  const relevant = holdings.filter((holding) => holding.holds.some((claim) => claims.includes(claim)));
  return {
    explainsSpectrum: explains(spectrum.filter((holding) => holding.holds.length === ALL_CLAIMS.length)),
    recommendation: {
      overall: relevant.length === 0 ? 'releasable' : 'held',
      byClaim: claims.map((claim) => {
        const reasons = relevant
          .filter((holding) => holding.holds.includes(claim))
          .map((holding) => holding.reason.code);
        return { claim, recommendation: reasons.length === 0 ? 'releasable' : 'held', reasons };
      }),
      reasons: relevant.map((holding) => holding.reason),
    },
    presence,
  };
}

function explains(spectrum: readonly Holding[]): ResultBody['explainsSpectrum'] {
  if (spectrum.length === 0) {
    return { verdict: 'supported', detail: 'The model and the named solvent regions account for every signal found.' };
  }
  const first = spectrum[0]?.reason;
  return { verdict: 'not-supported', detail: first?.detail ?? '' };
}

function presenceReasons(
  request: AnalysisRequest,
  answer: SpectrumAnswer,
  presence: ReadonlyMap<string, Verdict>,
): Holding[] {
  const named = (verdict: Verdict): string[] => [...presence].filter(([, v]) => v === verdict).map(([id]) => id);
  const doubtful = named('cannot-tell');
  const holdings: Holding[] = [];
  if (doubtful.length > 0) {
    holdings.push({
      holds: ALL_CLAIMS,
      reason: {
        code: 'presence-cannot-tell',
        detail: `The spectrum does not say whether ${doubtful.join(', ')} is there: something stands at its place that its spin system does not explain well, or the evidence is too weak.`,
      },
    });
  }
  if (named('supported').length === 0 && answer.compounds.length > 0) {
    holdings.push({
      holds: ALL_CLAIMS,
      reason: {
        code: 'no-panel-compound-found',
        detail: `None of the ${request.method.panel.length} compounds of the method is supported by this spectrum.`,
      },
    });
  }
  return holdings;
}

function groupReasons(
  request: AnalysisRequest,
  answer: SpectrumAnswer,
  presence: ReadonlyMap<string, Verdict>,
): Holding[] {
  const tolerance = request.method.acceptance?.groupRatioTolerance ?? methodDefaults.groupRatioTolerance;
  const apart = answer.compounds.flatMap((compound) =>
    presence.get(compound.id) !== 'supported'
      ? []
      : compound.spinSystems.flatMap((system) =>
          system.groups.flatMap(({ label, ratio }) =>
            ratio !== undefined && Math.abs(ratio.value - 1) > tolerance
              ? [`${compound.id} ${label} ${ratio.value.toFixed(3)}`]
              : [],
          ),
        ),
  );
  if (apart.length === 0) return [];
  return [
    {
      holds: ['ratios', 'amounts'],
      reason: {
        code: 'groups-disagree',
        detail: `Signal per proton differs between groups of one compound by more than ${tolerance}: ${apart.join('; ')}. Saturation, overlap or a wrong compound does that.`,
      },
    },
  ];
}
