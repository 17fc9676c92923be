import { z } from 'zod';
import { couplingHzSchema, labelSchema, shiftPpmSchema, shiftScaleSchema, sourceSchema } from './quantities.ts';

/** Most protons in one spin entry or system that the wire takes; what can be computed is decided by the physics. */
const PROTON_COUNT_MAX = 60;

const spinSchema = z.strictObject({
  label: labelSchema,
  protonCount: z
    .int()
    .min(1)
    .max(PROTON_COUNT_MAX)
    .describe('Magnetically equivalent protons: a CH3 is one spin of 3.'),
});

/** A proton group: one shift, one response factor, one decay. */
export const groupBodySchema = z
  .strictObject({
    label: labelSchema,
    shiftPpm: shiftPpmSchema,
    shiftScale: shiftScaleSchema,
    spins: z.array(spinSchema).min(1).max(PROTON_COUNT_MAX),
    source: sourceSchema,
  })
  .meta({ id: 'GroupBody', description: 'A proton group: one shift, one response factor, one decay.' });

export type GroupBody = z.infer<typeof groupBodySchema>;

/** One coupling parameter; symmetry may let it act on several pairs of spins. */
export const couplingBodySchema = z
  .strictObject({
    label: labelSchema,
    pairs: z
      .array(z.tuple([labelSchema, labelSchema]))
      .min(1)
      .max(100)
      .describe('Pairs of spin labels it acts on.'),
    couplingHz: couplingHzSchema,
    kind: z.enum(['geminal', 'vicinal', 'long-range', 'other']),
    source: sourceSchema,
  })
  .meta({ id: 'CouplingBody', description: 'One coupling parameter, acting on one or several pairs of spins.' });

export type CouplingBody = z.infer<typeof couplingBodySchema>;

const satelliteSchema = z
  .strictObject({
    nucleus: z.enum(['29Si', '13C']),
    groupLabel: labelSchema,
    couplingHz: couplingHzSchema,
    abundanceFraction: z
      .number()
      .min(0)
      .max(1)
      .describe('Share of the molecules that carry the nucleus in this place.'),
    source: sourceSchema,
  })
  .meta({
    id: 'SatelliteBody',
    description: 'A rare magnetic nucleus that splits one group of a share of the molecules.',
  });

/** One connected spin system of a compound, `count` identical copies a molecule. */
export const spinSystemBodySchema = z
  .strictObject({
    label: labelSchema,
    count: z.int().min(1).max(100).describe('Identical copies in a molecule, usually 1.'),
    groups: z.array(groupBodySchema).min(1).max(50),
    couplings: z.array(couplingBodySchema).max(500),
    satellites: z.array(satelliteSchema).max(20).optional(),
  })
  .superRefine(checkLabels)
  .meta({ id: 'SpinSystemBody', description: 'One connected spin system of a compound.' });

export type SpinSystemBody = z.infer<typeof spinSystemBodySchema>;

type Draft = {
  readonly groups: readonly GroupBody[];
  readonly couplings: readonly CouplingBody[];
  readonly satellites?: readonly { readonly groupLabel: string }[] | undefined;
};

/** Labels are unique, and whatever is referred to exists; a pair is coupled by one parameter only. */
function checkLabels(system: Draft, context: z.core.$RefinementCtx<Draft>): void {
  const fault = (path: PropertyKey[], message: string): void => context.addIssue({ code: 'custom', path, message });
  const groups = new Set<string>();
  const spins = new Set<string>();
  const couplings = new Set<string>();
  const pairs = new Set<string>();
  system.groups.forEach((group, groupIndex) => {
    if (groups.has(group.label)) fault(['groups', groupIndex, 'label'], `group "${group.label}" is named twice`);
    groups.add(group.label);
    group.spins.forEach((spin, spinIndex) => {
      if (spins.has(spin.label))
        fault(['groups', groupIndex, 'spins', spinIndex, 'label'], `spin "${spin.label}" is named twice`);
      spins.add(spin.label);
    });
  });
  system.couplings.forEach((coupling, couplingIndex) => {
    if (couplings.has(coupling.label))
      fault(['couplings', couplingIndex, 'label'], `coupling "${coupling.label}" is named twice`);
    couplings.add(coupling.label);
    coupling.pairs.forEach((pair, pairIndex) => {
      const path = ['couplings', couplingIndex, 'pairs', pairIndex];
      pair.forEach((label, end) => {
        if (!spins.has(label)) fault([...path, end], `no spin of this system is called "${label}"`);
      });
      if (pair[0] === pair[1]) fault(path, 'a spin is not coupled to itself');
      const key = JSON.stringify([...pair].sort());
      if (pairs.has(key)) fault(path, 'this pair of spins is coupled twice');
      pairs.add(key);
    });
  });
  (system.satellites ?? []).forEach((satellite, index) => {
    if (!groups.has(satellite.groupLabel)) {
      fault(['satellites', index, 'groupLabel'], `no group of this system is called "${satellite.groupLabel}"`);
    }
  });
}
