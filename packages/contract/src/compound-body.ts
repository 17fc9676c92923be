import { z } from 'zod';
import { labelSchema, shiftScaleSchema, sourceSchema } from './quantities.ts';
import { spinSystemBodySchema } from './spin-system-body.ts';

/**
 * What the catalogue holds of one compound: its spin systems with published shifts and couplings.
 * Every value cites its source; two systems of one compound carry different labels.
 */
export const compoundBodySchema = z
  .strictObject({
    name: labelSchema.describe('Name as chemists write it.'),
    formula: z.string().min(1).max(100).optional().describe('Molecular formula, such as C4H9NO2.'),
    casNumber: z
      .string()
      .regex(/^\d{2,7}-\d{2}-\d$/, 'expected a CAS registry number such as 56-12-2')
      .optional(),
    molarMassGramsPerMole: z.number().positive().max(100_000),
    spinSystems: z.array(spinSystemBodySchema).min(1).max(50),
    sources: z.array(sourceSchema).min(1).max(100).describe('Sources cited by the values of this entry.'),
    scaleZero: shiftScaleSchema.optional().describe('Present when the main singlet of this compound defines 0 ppm.'),
  })
  .superRefine((body, context) => {
    const seen = new Set<string>();
    body.spinSystems.forEach((system, index) => {
      if (seen.has(system.label)) {
        context.addIssue({
          code: 'custom',
          path: ['spinSystems', index, 'label'],
          message: `"${system.label}" is used twice`,
        });
      }
      seen.add(system.label);
    });
  })
  .meta({ id: 'CompoundBody', description: 'A catalogue entry: spin systems with published shifts and couplings.' });

export type CompoundBody = z.infer<typeof compoundBodySchema>;
