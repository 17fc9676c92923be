import { z } from 'zod';
import { slugSchema, versionSchema } from './identifiers.ts';
import { fractionSchema, labelSchema, positiveSchema, shiftPpmSchema } from './quantities.ts';

/** What a method means where it leaves a width or a limit out. Stated here once; the numbers are house choices. */
export const methodDefaults = {
  shiftSdPpm: 0.03,
  couplingSdHz: 0.5,
  geminalCouplingSdHz: 1.5,
  commonOffsetSdPpm: 0.05,
  residualFractionMax: 0.05,
  groupRatioTolerance: 0.04,
} as const;

const panelEntrySchema = z
  .strictObject({
    compoundId: slugSchema,
    compoundVersion: versionSchema
      .optional()
      .describe('Absent: the latest version when the method is created; then fixed.'),
    shiftSdPpm: positiveSchema
      .max(1)
      .optional()
      .describe(`Prior sd of each shift; ${methodDefaults.shiftSdPpm} when absent.`),
    couplingSdHz: positiveSchema
      .max(20)
      .optional()
      .describe(
        `Prior sd of each coupling; ${methodDefaults.couplingSdHz} when absent, geminal ${methodDefaults.geminalCouplingSdHz}.`,
      ),
    quantifierGroups: z.array(labelSchema).min(1).max(50).optional().describe('Groups that amounts are taken from.'),
  })
  .meta({ id: 'PanelEntry', description: 'A compound that the method expects, with the widths of its priors.' });

const windowSchema = z
  .strictObject({
    lowPpm: shiftPpmSchema,
    highPpm: shiftPpmSchema,
    baselineTermCount: z.int().min(0).max(12).optional(),
  })
  .refine((window) => window.lowPpm < window.highPpm, { path: ['highPpm'], message: 'expected highPpm > lowPpm' })
  .meta({ id: 'MethodWindow', description: 'A range of the spectrum that is analysed.' });

const rangeSchema = z
  .strictObject({ lowPpm: shiftPpmSchema, highPpm: shiftPpmSchema })
  .refine((range) => range.lowPpm < range.highPpm, { path: ['highPpm'], message: 'expected highPpm > lowPpm' })
  .meta({
    id: 'ExcludedRegion',
    description: 'A range of the spectrum in which signal is expected and not looked into.',
  });

const referenceSchema = z.strictObject({
  compoundId: slugSchema,
  compoundVersion: versionSchema.optional(),
  commonOffsetSdPpm: positiveSchema
    .max(10)
    .optional()
    .describe(`Prior sd of the offset of the whole axis; ${methodDefaults.commonOffsetSdPpm} when absent.`),
});

/** What a result of this method may state. */
export const claimSchema = z
  .enum(['shifts', 'ratios', 'amounts'])
  .meta({ id: 'Claim', description: 'What a result may state.' });

export type Claim = z.infer<typeof claimSchema>;

/** Versioned instructions: what is expected, where to look, what 0 ppm and the amounts rest on, what is acceptable. */
export const methodBodySchema = z
  .strictObject({
    name: labelSchema,
    panel: z.array(panelEntrySchema).min(1).max(200),
    windows: z.array(windowSchema).min(1).max(200).optional().describe("Absent: made from the panel's shifts."),
    excludedRegions: z
      .array(rangeSchema)
      .max(200)
      .optional()
      .describe("Ranges that nobody has to explain, beside the declared solvent's own."),
    reference: referenceSchema.describe('The compound in the tube that 0 ppm comes from.'),
    standard: z
      .strictObject({ compoundId: slugSchema })
      .optional()
      .describe('Quantity standard; must be in the preparation.'),
    claims: z.array(claimSchema).min(1).max(3),
    acceptance: z
      .strictObject({
        residualFractionMax: fractionSchema.optional().describe(`${methodDefaults.residualFractionMax} when absent.`),
        groupRatioTolerance: positiveSchema
          .max(1)
          .optional()
          .describe(`${methodDefaults.groupRatioTolerance} when absent.`),
      })
      .optional(),
  })
  .superRefine(checkMethod)
  .meta({ id: 'MethodBody', description: 'Versioned instructions for analysing acquisitions.' });

export type MethodBody = z.infer<typeof methodBodySchema>;

type Draft = {
  readonly panel: readonly { readonly compoundId: string }[];
  readonly claims: readonly string[];
  readonly reference: { readonly compoundId: string };
  readonly standard?: { readonly compoundId: string } | undefined;
};

/** A compound stands in the panel once, a claim is made once, amounts need a standard, and a standard is measured. */
function checkMethod(method: Draft, context: z.core.$RefinementCtx<Draft>): void {
  const compounds = new Set<string>();
  method.panel.forEach(({ compoundId }, index) => {
    if (compounds.has(compoundId)) {
      context.addIssue({
        code: 'custom',
        path: ['panel', index, 'compoundId'],
        message: `"${compoundId}" is in the panel twice`,
      });
    }
    compounds.add(compoundId);
  });
  if (new Set(method.claims).size < method.claims.length) {
    context.addIssue({ code: 'custom', path: ['claims'], message: 'expected each claim once' });
  }
  const standardId = method.standard?.compoundId;
  if (standardId !== undefined && standardId !== method.reference.compoundId && !compounds.has(standardId)) {
    context.addIssue({
      code: 'custom',
      path: ['standard', 'compoundId'],
      message: 'the standard is neither the reference nor in the panel',
    });
  }
  if (method.claims.includes('amounts') && method.standard === undefined) {
    context.addIssue({ code: 'custom', path: ['standard'], message: 'amounts need a quantity standard' });
  }
}
