import { z } from 'zod';
import { feedLimits } from './feed.ts';

/** A whole number as it stands in a query: digits only, so that `1e3`, `0x10` and an empty text are faults. */
function wholeNumber(max: number): z.ZodType<number, string> {
  return z
    .string()
    .regex(/^\d{1,9}$/, 'expected a whole number')
    .transform(Number)
    .pipe(z.int().min(1).max(max));
}

/** `?version=3` of a versioned document. */
export const versionQuerySchema = z.strictObject({
  version: wholeNumber(1_000_000).optional().describe('The version; the latest when absent.'),
});

/** `?after=CURSOR&limit=N` of the feed. */
export const feedQuerySchema = z.strictObject({
  after: z
    .string()
    .min(1)
    .max(200)
    .optional()
    .describe('Cursor of the last event taken; from the beginning when absent.'),
  limit: wholeNumber(feedLimits.max).optional().describe(`Most events in the page; ${feedLimits.usual} when absent.`),
});

/** An operation that takes no query parameters: any is a fault, since a mistyped name would else be ignored. */
export const emptyQuerySchema = z.strictObject({});
