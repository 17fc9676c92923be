import { z } from 'zod';
import { claimSchema } from './method-body.ts';

/** Named numbers and words that a person or a program can use without reading the sentence. */
export const factsSchema = z.record(z.string(), z.union([z.number(), z.string()]));

/** A range of the shift axis. */
export const regionPpmSchema = z
  .strictObject({ lowPpm: z.number(), highPpm: z.number() })
  .meta({ id: 'RegionPpm', description: 'A range of the shift axis.' });

/** The kebab-case name of a reason; new ones may come, so it is not closed. */
export const reasonCodeSchema = z
  .string()
  .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/)
  .meta({
    id: 'ReasonCode',
    description: 'Kebab-case name of a reason. New ones may come.',
    examples: ['sequence-undeclared'],
  });

export type ReasonCode = z.infer<typeof reasonCodeSchema>;

export const reasonSchema = z
  .strictObject({
    code: reasonCodeSchema,
    detail: z.string(),
    regionsPpm: z.array(regionPpmSchema).optional(),
    facts: factsSchema.optional(),
  })
  .meta({ id: 'Reason', description: 'Why a result is held or releasable.' });

export type Reason = z.infer<typeof reasonSchema>;

/** The machine's opinion; the decision is a person's or the method's rule. */
export const releaseSchema = z
  .enum(['releasable', 'held'])
  .meta({ id: 'Release', description: "The machine's opinion; the decision is a person's or the method's rule." });

export type Release = z.infer<typeof releaseSchema>;

/** The recommendation on the whole and claim by claim. */
export const recommendationSchema = z
  .strictObject({
    overall: releaseSchema,
    byClaim: z.array(
      z.strictObject({ claim: claimSchema, recommendation: releaseSchema, reasons: z.array(reasonCodeSchema) }),
    ),
    reasons: z.array(reasonSchema).describe('In order of weight.'),
  })
  .meta({
    id: 'Recommendation',
    description: 'Releasable or held, on the whole and claim by claim, with reasons in order of weight.',
  });

export type Recommendation = z.infer<typeof recommendationSchema>;
