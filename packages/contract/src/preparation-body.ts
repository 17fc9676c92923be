import { z } from 'zod';
import { slugSchema } from './identifiers.ts';
import { labelSchema, positiveSchema } from './quantities.ts';

/** One tube made from a sample: what the amounts rest on. */
export const preparationBodySchema = z
  .strictObject({
    label: labelSchema.optional(),
    standard: z.strictObject({
      compoundId: slugSchema,
      amountConcentration: z.strictObject({
        value: positiveSchema,
        standardUncertainty: positiveSchema,
        unit: z.literal('mmol/L').describe('UCUM unit.'),
      }),
    }),
  })
  .meta({
    id: 'PreparationBody',
    description: 'One tube: the quantity standard in it and how much, with its standard uncertainty.',
  });

export type PreparationBody = z.infer<typeof preparationBodySchema>;
