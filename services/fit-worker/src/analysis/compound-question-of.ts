import type { CompoundBody, Conditions, MethodBody, SpinSystemBody } from '@spinassay/contract';
import { methodDefaults } from '@spinassay/contract';
import {
  type CompoundQuestion,
  type NormalPrior,
  responsePrior,
  type SpinSystemQuestion,
} from '@spinassay/spectrum-inference';
import { convertShift, partsPerMillion, type ShiftScale } from '@spinassay/units';

/** What shapes the priors of a compound besides its catalogue entry. */
export interface PriorContext {
  /** Absent for the reference. */
  readonly entry?: MethodBody['panel'][number];
  /** Scale of the reference in the tube; absent when it is not known to define one. */
  readonly scale: ShiftScale | undefined;
  readonly conditions: Conditions;
  readonly samples: Float64Array;
  readonly dwellSeconds: number;
}

/** A catalogue entry as a question: published values as prior means, widths from the method. */
export function compoundQuestionOf(id: string, body: CompoundBody, context: PriorContext): CompoundQuestion {
  return { id, spinSystems: body.spinSystems.map((system) => spinSystemOf(system, context)) };
}

function spinSystemOf(system: SpinSystemBody, context: PriorContext): SpinSystemQuestion {
  const spinLabels = system.groups.flatMap((group) => group.spins.map((spin) => spin.label));
  const responseFactor = responseOf(context);
  return {
    label: system.label,
    copyCount: system.count,
    groups: system.groups.map((group) => ({
      label: group.label,
      shiftPpm: {
        mean: convertShift(
          partsPerMillion(group.shiftPpm),
          { from: group.shiftScale, to: context.scale ?? group.shiftScale },
          context.conditions.pH,
        ),
        sd: context.entry?.shiftSdPpm ?? methodDefaults.shiftSdPpm,
      },
      responseFactor,
      spins: group.spins,
    })),
    couplings: system.couplings.map((coupling) => ({
      label: coupling.label,
      couplingHz: { mean: coupling.couplingHz, sd: couplingSd(coupling.kind, context) },
      pairs: coupling.pairs.map(([a, b]) => [spinLabels.indexOf(a), spinLabels.indexOf(b)] as const),
    })),
    satellites: (system.satellites ?? []).map((satellite) => ({
      groupIndex: system.groups.findIndex((group) => group.label === satellite.groupLabel),
      couplingHz: satellite.couplingHz,
      abundanceFraction: satellite.abundanceFraction,
    })),
  };
}

function couplingSd(kind: string, { entry }: PriorContext): number {
  const stated = entry?.couplingSdHz;
  // A geminal coupling is the least known one, whatever the method says of the others (REFERENCE section 10).
  if (kind === 'geminal') return Math.max(stated ?? 0, methodDefaults.geminalCouplingSdHz);
  return stated ?? methodDefaults.couplingSdHz;
}

function responseOf({ conditions, samples, dwellSeconds }: PriorContext): NormalPrior {
  const acquisitionSeconds = conditions.acquisitionTimeSeconds ?? (samples.length / 2) * dwellSeconds;
  const isPulsed = conditions.sequence === 'single-pulse';
  return responsePrior({
    flipAngleDegrees: isPulsed ? conditions.flipAngleDegrees : undefined,
    repetitionSeconds:
      conditions.recycleDelaySeconds === undefined ? undefined : conditions.recycleDelaySeconds + acquisitionSeconds,
  });
}
