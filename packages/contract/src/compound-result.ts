import { z } from 'zod';
import { estimateSchema, quantitySchema } from './estimate.ts';
import { slugSchema, versionSchema } from './identifiers.ts';
import { labelSchema } from './quantities.ts';

/** The third is an answer, not a failure. */
export const verdictSchema = z
  .enum(['supported', 'not-supported', 'cannot-tell'])
  .meta({ id: 'Verdict', description: 'What the data say of a statement. The third is an answer, not a failure.' });

export type Verdict = z.infer<typeof verdictSchema>;

/** One proton group: its shift, width and amplitude relative to what the compound's amount predicts. */
export const groupResultSchema = z
  .strictObject({
    label: labelSchema,
    protonCount: z.int().min(1),
    shift: estimateSchema,
    linewidth: estimateSchema,
    ratio: estimateSchema.optional(),
  })
  .meta({ id: 'GroupResult', description: 'One proton group: shift, linewidth and relative amplitude.' });

export type GroupResult = z.infer<typeof groupResultSchema>;

export const couplingResultSchema = z
  .strictObject({
    label: labelSchema,
    pairs: z.array(z.tuple([labelSchema, labelSchema])),
    kind: z.enum(['geminal', 'vicinal', 'long-range', 'other']),
    coupling: estimateSchema,
  })
  .meta({ id: 'CouplingResult', description: 'One coupling parameter.' });

export type CouplingResult = z.infer<typeof couplingResultSchema>;

/** An amount with its uncertainty budget (JCGM 100). */
export const amountSchema = z
  .strictObject({
    species: labelSchema,
    quantityKind: z.literal('amount-concentration'),
    basis: z.literal('tube'),
    unit: z.literal('mmol/L'),
    rawEstimate: z.number().describe('Unbiased; may be negative.'),
    comparator: z.enum(['=', '<']),
    posterior: estimateSchema,
    combinedStandardUncertainty: z.number().min(0),
    coverageFactor: z.number().positive(),
    expandedUncertainty: z.number().min(0),
    budget: z.array(z.strictObject({ source: labelSchema, standardUncertaintyRelative: z.number().min(0) })),
    reported: z.string().describe('Rounded once; the expanded uncertainty to two significant digits.'),
  })
  .meta({ id: 'Amount', description: 'An amount with its combined and expanded uncertainty and their budget.' });

export type Amount = z.infer<typeof amountSchema>;

const presenceSchema = z.strictObject({
  verdict: verdictSchema,
  logBayesFactor: z.number().describe('Natural logarithm, present against absent.'),
  amplitudePrior: z.string().describe('The prior of the amplitude in words, since the factor depends on it.'),
  upperLimit: quantitySchema.optional(),
});

const spinSystemResultSchema = z.strictObject({
  label: labelSchema,
  groups: z.array(groupResultSchema),
  couplings: z.array(couplingResultSchema),
  exchangeable: z.array(z.string()).describe('Labels whose assignment this spectrum cannot tell apart.'),
});

/** What was found of one compound of the panel. */
export const compoundResultSchema = z
  .strictObject({
    compoundId: slugSchema,
    compoundVersion: versionSchema,
    name: labelSchema,
    presence: presenceSchema,
    amount: amountSchema.optional(),
    spinSystems: z.array(spinSystemResultSchema),
  })
  .meta({ id: 'CompoundResult', description: 'What was found of one compound of the panel.' });

export type CompoundResult = z.infer<typeof compoundResultSchema>;
