import type { Reason } from '@spinassay/contract';
import { methodDefaults } from '@spinassay/contract';
import type { SpectrumQuestion } from '@spinassay/spectrum-inference';
import type { AnalysisRequest } from './analysis-request.ts';
import { compoundQuestionOf } from './compound-question-of.ts';
import { solventRegions } from './solvent-regions.ts';

/** A question the inference can take, or why there is none. */
export type AskedQuestion =
  | { readonly kind: 'question'; readonly question: SpectrumQuestion }
  | { readonly kind: 'unanswerable'; readonly reasons: readonly Reason[] };

/** Turn wire documents into a question in physics terms. Nothing is guessed: what is needed and undeclared is a reason. */
export function questionOf(request: AnalysisRequest): AskedQuestion {
  const { conditions, method } = request;
  const axis = axisOf(request);
  if (axis === undefined) {
    return {
      kind: 'unanswerable',
      reasons: [
        {
          code: 'shift-axis-undeclared',
          detail:
            'The conditions declare neither carrierPpm nor referenceFrequencyMHz, so no frequency can be given a chemical shift. Declare one of them.',
        },
      ],
    };
  }
  const reference = request.compounds[method.reference.compoundId];
  const scale = reference?.body.scaleZero;
  return {
    kind: 'question',
    question: {
      samples: request.samples,
      dwellSeconds: request.dwellSeconds,
      ...axis,
      timeZeroSamples: conditions.timeZeroSampleIndex ?? 0,
      compounds: method.panel.flatMap((entry) => {
        const compound = request.compounds[entry.compoundId];
        return compound === undefined
          ? []
          : [compoundQuestionOf(entry.compoundId, compound.body, { entry, scale, ...request })];
      }),
      reference:
        reference === undefined
          ? undefined
          : compoundQuestionOf(method.reference.compoundId, reference.body, { scale, ...request }),
      windows: method.windows ?? [],
      excludedRegions: [...solventRegions(conditions), ...(method.excludedRegions ?? [])],
      commonOffsetSdPpm: method.reference.commonOffsetSdPpm ?? methodDefaults.commonOffsetSdPpm,
      seed: request.seed,
    },
  };
}

/** Carrier and Hz per ppm, from whichever pair of declarations gives them. */
function axisOf({
  conditions,
  observeFrequencyMHz,
}: AnalysisRequest): { carrierPpm: number; hertzPerPpm: number } | undefined {
  const { carrierPpm, referenceFrequencyMHz } = conditions;
  if (referenceFrequencyMHz !== undefined) {
    const fromFrequencies = ((observeFrequencyMHz - referenceFrequencyMHz) / referenceFrequencyMHz) * 1e6;
    return { carrierPpm: carrierPpm ?? fromFrequencies, hertzPerPpm: referenceFrequencyMHz };
  }
  if (carrierPpm === undefined) return undefined;
  return { carrierPpm, hertzPerPpm: observeFrequencyMHz / (1 + carrierPpm * 1e-6) };
}
