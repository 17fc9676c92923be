import { z } from 'zod';

/** A name that a person chose, in kebab-case: ids of compounds, methods and preparations. */
export const slugSchema = z
  .string()
  .max(80, 'expected at most 80 characters')
  .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'expected kebab-case: lower-case letters and digits, joined by single hyphens')
  .meta({
    id: 'Slug',
    description: 'A name in kebab-case, chosen by the laboratory.',
    examples: ['4-aminobutyric-acid'],
  });

/** A name that the service gave: ids of acquisitions and fits (RFC 9562). */
export const serviceIdSchema = z.uuid().meta({
  id: 'ServiceId',
  description: 'A UUID given by the service.',
  examples: ['0190c3a2-7d55-7c11-9c5e-3f0d6b2f6a01'],
});

/** SHA-256 in lower-case hexadecimal (FIPS 180-4). */
export const sha256Schema = z
  .string()
  .regex(/^[0-9a-f]{64}$/, 'expected 64 lower-case hexadecimal digits')
  .meta({
    id: 'Sha256',
    description: 'SHA-256 digest in lower-case hexadecimal.',
    examples: ['ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'],
  });

/** Versions count from 1 and never vanish. */
export const versionSchema = z.int().min(1).max(1_000_000).describe('Version number, counted from 1.');

/** Time of the database clock, RFC 3339 in UTC. */
export const timestampSchema = z.iso.datetime().describe('RFC 3339 time in UTC.');
