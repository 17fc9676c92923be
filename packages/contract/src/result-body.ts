import { z } from 'zod';
import { compoundResultSchema, verdictSchema } from './compound-result.ts';
import { sha256Schema, slugSchema } from './identifiers.ts';
import { shiftScaleSchema } from './quantities.ts';
import { factsSchema, reasonCodeSchema, recommendationSchema } from './recommendation.ts';

const inputsSchema = z
  .strictObject({
    signalSha256: sha256Schema,
    conditionsSha256: sha256Schema,
    methodSha256: sha256Schema,
    compoundSha256s: z.record(slugSchema, sha256Schema),
    preparationSha256: sha256Schema.optional(),
    optionsSha256: sha256Schema,
  })
  .meta({ id: 'ResultInputs', description: 'Every input, named by the digest of its content.' });

const referenceResultSchema = z
  .strictObject({
    compoundId: slugSchema,
    scale: shiftScaleSchema,
    found: z.boolean(),
    shiftOffsetPpm: z.number().optional().describe('Fitted offset of the axis; reported, never subtracted silently.'),
    shiftOffsetSdPpm: z.number().min(0).optional(),
    linewidthHz: z.number().optional().describe('Full width at half maximum.'),
    amplitude: z.number().optional(),
    amplitudeWithoutSatellites: z.number().optional().describe('What a model without satellites would have found.'),
    signalToNoise: z.number().optional(),
    facts: factsSchema.optional(),
  })
  .meta({
    id: 'ReferenceResult',
    description: 'The line that 0 ppm comes from. Figures are absent when it was not found.',
  });

const signalResultSchema = z
  .strictObject({
    sampleCount: z.int(),
    firstSampleIndex: z.int().min(0).describe('First sample in the likelihood.'),
    dwellSeconds: z.number(),
    observeFrequencyMHz: z.number(),
    noiseSdPerComponent: z.number(),
    phaseRadians: z.number(),
    timeZeroSamples: z.number(),
  })
  .meta({ id: 'SignalResult', description: 'What was found of the signal itself.' });

const windowResultSchema = z
  .strictObject({
    lowPpm: z.number(),
    highPpm: z.number(),
    binCount: z.int(),
    baselineTermCount: z.int(),
    residualFraction: z.number(),
    reducedChiSquare: z.number(),
  })
  .meta({ id: 'WindowResult', description: 'How well one window is explained.' });

const unexplainedSchema = z
  .strictObject({
    lowPpm: z.number(),
    highPpm: z.number(),
    significanceSigma: z.number(),
  })
  .meta({ id: 'UnexplainedRegion', description: 'Signal that the model does not account for.' });

const artefactSchema = z
  .strictObject({ code: reasonCodeSchema, detail: z.string(), facts: factsSchema.optional() })
  .meta({ id: 'Artefact', description: 'A named disturbance of the measurement.' });

const diagnosticsSchema = z
  .strictObject({
    startCount: z.int(),
    evaluationCount: z.int(),
    modeCount: z.int(),
    converged: z.boolean(),
    facts: factsSchema.optional().describe('Further figures of the search, by name.'),
  })
  .meta({ id: 'SearchDiagnostics', description: 'Search and sampling in figures.' });

/** The name and version of this document's shape, carried inside every result. */
export const resultSchemaName = 'spinassay-result/1';

/**
 * The result of one fit. Its canonical JSON bytes hold no ids, times or hosts, so that the same inputs,
 * seed and numericsId give the same bytes anywhere.
 */
export const resultBodySchema = z
  .strictObject({
    schema: z.literal(resultSchemaName),
    inputs: inputsSchema,
    engineVersion: z.string(),
    numericsId: z.string().describe('Digest of kernel, runtime and architecture.'),
    seed: z
      .string()
      .regex(/^\d{1,20}$/)
      .describe('Unsigned 64-bit integer in decimal.'),
    explainsSpectrum: z.strictObject({ verdict: verdictSchema, detail: z.string() }),
    recommendation: recommendationSchema,
    reference: referenceResultSchema,
    signal: signalResultSchema,
    discrepancy: z
      .strictObject({ mean: z.number(), sd: z.number() })
      .describe('Share of the model that is allowed to be wrong.'),
    compounds: z.array(compoundResultSchema),
    windows: z.array(windowResultSchema),
    unexplained: z.array(unexplainedSchema),
    artefacts: z.array(artefactSchema),
    radiationDamping: z.strictObject({ noticed: z.boolean(), detail: z.string(), facts: factsSchema }),
    diagnostics: diagnosticsSchema,
    sources: z.array(z.string()).describe('Of every catalogue value used.'),
    cautions: z.array(z.string()),
  })
  .meta({ id: 'ResultBody', description: 'The result of one fit: canonical JSON without ids, times or hosts.' });

export type ResultBody = z.infer<typeof resultBodySchema>;
