import { z } from 'zod';
import { conditionsSchema } from './conditions.ts';
import { serviceIdSchema, sha256Schema, timestampSchema, versionSchema } from './identifiers.ts';
import { positiveSchema } from './quantities.ts';

/** Fewest and most complex samples of one signal. */
export const sampleCountLimits = { min: 16, max: 4_194_304 } as const;

/** A signal given as numbers: interleaved re, im pairs, little-endian, base64 (RFC 4648 section 4). */
export const signalBodySchema = z
  .strictObject({
    encoding: z.enum(['float32', 'float64', 'int32']).describe('Little-endian number format of each component.'),
    data: z.base64().describe('Interleaved re, im, re, im, ... in base64 with padding.'),
    sampleCount: z.int().min(sampleCountLimits.min).max(sampleCountLimits.max).describe('Complex samples.'),
    dwellSeconds: positiveSchema.max(1).describe('Time from one complex sample to the next.'),
    observeFrequencyMHz: positiveSchema.max(2_500),
    nucleus: z.literal('1H').optional(),
    title: z.string().max(500).optional().describe('Shown, never interpreted.'),
  })
  .meta({
    id: 'SignalBody',
    description: 'A FID as numbers. Spectrum = FFT with exp(-2 pi i f t); a positive offset is a higher ppm.',
  });

export type SignalBody = z.infer<typeof signalBodySchema>;

/** A measured signal: either the text of a JCAMP-DX file or the numbers, with what is known of its making. */
export const acquisitionPostSchema = z
  .strictObject({
    jcampDx: z.string().min(1).optional().describe('Text of a JCAMP-DX file that holds one FID.'),
    signal: signalBodySchema.optional(),
    conditions: conditionsSchema.optional().describe('Win over what the file says; both are kept.'),
  })
  .refine((post) => (post.jcampDx === undefined) !== (post.signal === undefined), {
    message: 'expected exactly one of jcampDx and signal',
  })
  .meta({
    id: 'AcquisitionPost',
    description: 'A measured signal with its declared conditions.',
    oneOf: [{ required: ['jcampDx'] }, { required: ['signal'] }],
  });

export type AcquisitionPost = z.infer<typeof acquisitionPostSchema>;

/** A stored acquisition. The signal never changes; its conditions are versioned beside it. */
export const acquisitionSchema = z
  .strictObject({
    id: serviceIdSchema,
    signalSha256: sha256Schema.describe(
      'Over a canonical header of dwell and observe frequency, then the float64 samples.',
    ),
    conditionsVersion: versionSchema,
    conditionsSha256: sha256Schema,
    conditions: conditionsSchema.describe('In force: declared, else from the file.'),
    declaredConditions: conditionsSchema.describe('As sent with the signal.'),
    fileConditions: conditionsSchema.describe('As found in the file.'),
    title: z.string().optional(),
    sampleCount: z.int(),
    dwellSeconds: positiveSchema,
    observeFrequencyMHz: positiveSchema,
    nucleus: z.literal('1H'),
    original: z
      .strictObject({ mediaType: z.string(), byteCount: z.int(), sha256: sha256Schema })
      .describe('The bytes as they came; read them under /original.'),
    receivedAt: timestampSchema,
  })
  .meta({ id: 'Acquisition', description: 'A stored signal with the conditions in force.' });

export type Acquisition = z.infer<typeof acquisitionSchema>;
