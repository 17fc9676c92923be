import { z } from 'zod';

/** UCUM units of everything a result states; ppm is the shift scale's own unit. */
const unitSchema = z.enum(['ppm', 'Hz', '1', 'mmol/L']);

/** A number with its unit. */
export const quantitySchema = z
  .strictObject({ value: z.number(), unit: unitSchema })
  .meta({ id: 'Quantity', description: 'A number with its unit (UCUM; ppm for shifts).' });

export type Quantity = z.infer<typeof quantitySchema>;

/** A posterior in short: mean, sd and central 95 % interval, with the prior and how far the data moved it. */
export const estimateSchema = z
  .strictObject({
    value: z.number(),
    sd: z.number().min(0),
    low95: z.number(),
    high95: z.number(),
    unit: unitSchema,
    prior: z.strictObject({ mean: z.number(), sd: z.number().positive() }).optional(),
    informedFraction: z
      .number()
      .max(1)
      .optional()
      .describe('1 - sd^2 / prior sd^2: near 0 the data did not inform the value.'),
  })
  .meta({ id: 'Estimate', description: 'A posterior in short: mean, sd, central 95 % interval, prior.' });

export type Estimate = z.infer<typeof estimateSchema>;
