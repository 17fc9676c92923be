import { z } from 'zod';
import { labelSchema, positiveSchema, shiftPpmSchema } from './quantities.ts';

/** The sequences whose effect on amplitudes is modelled; `other` allows no amounts. */
export const sequenceSchema = z
  .enum(['single-pulse', 'presaturation', 'noesy-1d-presaturation', 'cpmg', 'other'])
  .meta({ id: 'Sequence', description: 'The pulse sequence. Left out means undeclared: the result is held.' });

export type Sequence = z.infer<typeof sequenceSchema>;

/**
 * How an acquisition was made, as far as it is declared. Nothing is guessed: what is absent is unknown.
 * Delay, acquisition time and dummy scans are kept apart; the repetition time is their consequence.
 */
export const conditionsSchema = z
  .strictObject({
    sequence: sequenceSchema.optional(),
    flipAngleDegrees: z.number().positive().max(360).optional(),
    recycleDelaySeconds: z
      .number()
      .min(0)
      .max(3_600)
      .optional()
      .describe('From the end of one scan to the next pulse.'),
    acquisitionTimeSeconds: positiveSchema.max(3_600).optional(),
    dummyScans: z.int().min(0).max(100_000).optional(),
    scanCount: z.int().min(1).max(100_000_000).optional(),
    temperatureCelsius: z.number().min(-150).max(250).optional(),
    pH: z.number().min(-2).max(16).optional(),
    pHScale: z.enum(['pH', 'pD', 'meter-reading']).optional().describe('What the number in pH is.'),
    solvent: labelSchema.optional(),
    fieldTesla: positiveSchema.max(50).optional(),
    observeFrequencyMHz: positiveSchema.max(2_500).optional(),
    referenceFrequencyMHz: positiveSchema.max(2_500).optional().describe('Absolute frequency of 0 ppm.'),
    carrierPpm: shiftPpmSchema.optional().describe('Shift at the carrier, which is 0 Hz of the signal.'),
    spectralWidthHz: positiveSchema.max(10_000_000).optional(),
    timeZeroSampleIndex: z
      .number()
      .min(-1_000)
      .max(10_000)
      .optional()
      .describe('Sample at which time is zero, fractional, counted from 0.'),
    sampleLabel: labelSchema.optional().describe('Shown, never interpreted.'),
    measuredAt: z.iso.datetime({ offset: true }).optional().describe('Time of the instrument, RFC 3339 with its zone.'),
  })
  .meta({
    id: 'Conditions',
    description: 'Declared conditions of an acquisition. What is absent is unknown and is never guessed.',
    examples: [{ sequence: 'single-pulse', flipAngleDegrees: 90, recycleDelaySeconds: 25, solvent: 'D2O' }],
  });

export type Conditions = z.infer<typeof conditionsSchema>;
