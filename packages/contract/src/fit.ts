import { z } from 'zod';
import { serviceIdSchema, sha256Schema, slugSchema, timestampSchema, versionSchema } from './identifiers.ts';
import { problemSchema } from './problem.ts';
import { fractionSchema } from './quantities.ts';

/** Choices of one fit beyond its method. None exist yet; the object is part of the natural key so that they can come. */
export const fitOptionsSchema = z
  .strictObject({})
  .meta({ id: 'FitOptions', description: 'Choices of one fit beyond its method. None exist yet.' });

export type FitOptions = z.infer<typeof fitOptionsSchema>;

/** Ask for one analysis of an acquisition by one method version. Asking twice is asking once. */
export const fitPostSchema = z
  .strictObject({
    acquisitionId: serviceIdSchema,
    methodId: slugSchema,
    methodVersion: versionSchema.optional().describe('The latest when absent.'),
    preparationId: slugSchema.optional(),
    preparationVersion: versionSchema.optional().describe('The latest when absent.'),
    options: fitOptionsSchema.optional(),
    repeatReason: z
      .string()
      .min(1)
      .max(500)
      .optional()
      .describe('Why the same fit is wanted again; makes it another fit.'),
  })
  .refine((post) => post.preparationVersion === undefined || post.preparationId !== undefined, {
    path: ['preparationId'],
    message: 'a preparationVersion needs its preparationId',
  })
  .meta({ id: 'FitPost', description: 'Ask for one analysis of an acquisition by one method version.' });

export type FitPost = z.infer<typeof fitPostSchema>;

export const fitStatusSchema = z
  .enum(['queued', 'running', 'completed', 'failed', 'cancelled'])
  .meta({ id: 'FitStatus', description: 'The last three are final.' });

export type FitStatus = z.infer<typeof fitStatusSchema>;

/** A fit and how far it is. Its result, once there, never changes. */
export const fitSchema = z
  .strictObject({
    id: serviceIdSchema,
    status: fitStatusSchema,
    stage: z.string().optional().describe('What the analysis is at, while it runs.'),
    fraction: fractionSchema.optional().describe('How far the analysis is, while it runs.'),
    attempt: z.int().min(0).describe('Times it was taken up.'),
    acquisitionId: serviceIdSchema,
    conditionsVersion: versionSchema,
    methodId: slugSchema,
    methodVersion: versionSchema,
    preparationId: slugSchema.optional(),
    preparationVersion: versionSchema.optional(),
    options: fitOptionsSchema,
    repeatReason: z.string().optional(),
    inputSha256: sha256Schema.describe('Digest of every input; its first 64 bits are the seed.'),
    seed: z
      .string()
      .regex(/^\d{1,20}$/)
      .describe('Unsigned 64-bit integer in decimal.'),
    resultSha256: sha256Schema.optional().describe('Present when completed.'),
    problem: problemSchema.optional().describe('Present when failed.'),
    createdAt: timestampSchema,
    finishedAt: timestampSchema.optional(),
  })
  .meta({ id: 'Fit', description: 'A fit and how far it is.' });

export type Fit = z.infer<typeof fitSchema>;
