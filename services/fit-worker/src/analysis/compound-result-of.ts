import type { CompoundBody, CompoundResult, Quantity } from '@spinassay/contract';
import type { CompoundAnswer, Estimate, SpinSystemAnswer } from '@spinassay/spectrum-inference';
import { amountOf } from './amount-of.ts';
import type { AnalysisRequest } from './analysis-request.ts';
import { compoundQuestionOf, type PriorContext } from './compound-question-of.ts';
import type { Judgement } from './judge.ts';

type WireEstimate = CompoundResult['spinSystems'][number]['groups'][number]['shift'];

/** One compound of an answer, on the wire. */
export function compoundResultOf(
  request: AnalysisRequest,
  compound: CompoundAnswer,
  judgement: Judgement,
): CompoundResult {
  const catalogue = request.compounds[compound.id];
  if (catalogue === undefined) throw new RangeError(`expected the catalogue entry of ${compound.id}`);
  const amount = amountOf(request, compound, compound.amountOverReference);
  const limit = upperLimitOf(request, compound);
  return {
    compoundId: compound.id,
    compoundVersion: catalogue.version,
    name: catalogue.body.name,
    presence: {
      verdict: judgement.presence.get(compound.id) ?? 'cannot-tell',
      logBayesFactor: compound.logBayesFactor,
      amplitudePrior: `normal about 0, sd ${compound.amountPriorSd.toPrecision(4)} signal units per proton: the largest sample of the FID`,
      ...(limit === undefined ? {} : { upperLimit: limit }),
    },
    ...(amount === undefined ? {} : { amount }),
    spinSystems: compound.spinSystems.map((system, s) =>
      systemResultOf(request, catalogue.body, compound.id, system, s),
    ),
  };
}

/** In mmol/L where the standard allows it, else relative to the reference (per proton), else in units of the signal. */
function upperLimitOf({ preparation, method }: AnalysisRequest, compound: CompoundAnswer): Quantity | undefined {
  if (compound.upperLimit === undefined) return undefined;
  const relative = compound.upperLimitOverReference;
  if (relative === undefined) return { value: compound.upperLimit, unit: '1' };
  const standard = preparation?.standard;
  if (standard === undefined || standard.compoundId !== method.standard?.compoundId)
    return { value: relative, unit: '1' };
  return { value: relative * standard.amountConcentration.value, unit: standard.amountConcentration.unit };
}

function systemResultOf(
  request: AnalysisRequest,
  body: CompoundBody,
  compoundId: string,
  system: SpinSystemAnswer,
  index: number,
): CompoundResult['spinSystems'][number] {
  const entry = request.method.panel.find((candidate) => candidate.compoundId === compoundId);
  const context: PriorContext = {
    ...(entry === undefined ? {} : { entry }),
    scale: request.compounds[request.method.reference.compoundId]?.body.scaleZero,
    ...request,
  };
  const asked = compoundQuestionOf(compoundId, body, context).spinSystems[index];
  const catalogue = body.spinSystems[index];
  if (asked === undefined || catalogue === undefined)
    throw new RangeError(`expected spin system ${index} of ${compoundId}`);
  return {
    label: system.label,
    groups: system.groups.map((group, g) => ({
      label: group.label,
      protonCount: group.protonCount,
      shift: withPrior(group.shiftPpm, 'ppm', asked.groups[g]?.shiftPpm),
      linewidth: { ...group.linewidthHz, unit: 'Hz' },
      ...(group.ratio === undefined ? {} : { ratio: { ...group.ratio, unit: '1' as const } }),
    })),
    couplings: system.couplings.map((coupling, j) => ({
      label: coupling.label,
      pairs: catalogue.couplings[j]?.pairs ?? [],
      kind: catalogue.couplings[j]?.kind ?? 'other',
      coupling: withPrior(coupling.couplingHz, 'Hz', asked.couplings[j]?.couplingHz),
    })),
    exchangeable: system.exchangeable.map((labels) => labels.join(' and ')),
  };
}

function withPrior(
  estimate: Estimate,
  unit: 'ppm' | 'Hz',
  prior: { mean: number; sd: number } | undefined,
): WireEstimate {
  const { value, sd, low95, high95 } = estimate;
  if (prior === undefined || !(prior.sd > 0)) return { value, sd, low95, high95, unit };
  return {
    value,
    sd,
    low95,
    high95,
    unit,
    prior: { mean: prior.mean, sd: prior.sd },
    informedFraction: 1 - (sd * sd) / (prior.sd * prior.sd),
  };
}
