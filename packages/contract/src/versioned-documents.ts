import { z } from 'zod';
import { compoundBodySchema } from './compound-body.ts';
import { sha256Schema, slugSchema, timestampSchema, versionSchema } from './identifiers.ts';
import { methodBodySchema } from './method-body.ts';
import { preparationBodySchema } from './preparation-body.ts';

/** What every stored version says of itself, beside its body. */
const versionFields = {
  id: slugSchema,
  version: versionSchema,
  sha256: sha256Schema.describe('Over the canonical JSON of the body.'),
  createdAt: timestampSchema,
};

export const compoundPostSchema = z.strictObject({ id: slugSchema, body: compoundBodySchema }).meta({
  id: 'CompoundPost',
  description: 'Version 1 of a compound, or its next version when the body differs from the latest.',
});
export const compoundSchema = z
  .strictObject({ ...versionFields, body: compoundBodySchema })
  .meta({ id: 'Compound', description: 'One version of a compound.' });

export const methodPostSchema = z.strictObject({ id: slugSchema, body: methodBodySchema }).meta({
  id: 'MethodPost',
  description: 'Version 1 of a method, or its next version when the resolved body differs from the latest.',
});
export const methodSchema = z
  .strictObject({ ...versionFields, body: methodBodySchema })
  .meta({ id: 'Method', description: 'One version of a method; every compound version in it is fixed.' });

export const preparationPostSchema = z.strictObject({ id: slugSchema, body: preparationBodySchema }).meta({
  id: 'PreparationPost',
  description: 'Version 1 of a preparation, or its next version when the body differs from the latest.',
});
export const preparationSchema = z
  .strictObject({ ...versionFields, body: preparationBodySchema })
  .meta({ id: 'Preparation', description: 'One version of a preparation.' });

/** The latest version of each compound or method, without bodies, in order of id. */
export const documentListSchema = z
  .strictObject({
    items: z.array(z.strictObject({ ...versionFields, name: z.string() })),
  })
  .meta({ id: 'DocumentList', description: 'The latest version of each, without bodies, in order of id.' });

export type CompoundPost = z.infer<typeof compoundPostSchema>;
export type Compound = z.infer<typeof compoundSchema>;
export type MethodPost = z.infer<typeof methodPostSchema>;
export type Method = z.infer<typeof methodSchema>;
export type PreparationPost = z.infer<typeof preparationPostSchema>;
export type Preparation = z.infer<typeof preparationSchema>;
export type DocumentList = z.infer<typeof documentListSchema>;
