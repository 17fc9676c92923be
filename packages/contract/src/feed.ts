import { z } from 'zod';
import { serviceIdSchema, sha256Schema, slugSchema, timestampSchema, versionSchema } from './identifiers.ts';
import { releaseSchema } from './recommendation.ts';

/** Most and usual number of events in one page. */
export const feedLimits = { max: 500, usual: 100 } as const;

/** Something that happened to a result, in commit order within a laboratory. */
export const feedEventSchema = z
  .strictObject({
    cursor: z.string().describe('Opaque; pass it as `after` to go on behind this event.'),
    kind: z.enum(['result']).describe('Further kinds will come; skip those you do not know.'),
    fitId: serviceIdSchema,
    acquisitionId: serviceIdSchema,
    methodId: slugSchema,
    methodVersion: versionSchema,
    recommendation: releaseSchema,
    resultSha256: sha256Schema,
    committedAt: timestampSchema,
  })
  .meta({ id: 'FeedEvent', description: 'Something that happened to a result.' });

export type FeedEvent = z.infer<typeof feedEventSchema>;

/** A page of the feed; an empty page gives back the cursor it was asked with. */
export const feedPageSchema = z
  .strictObject({
    events: z.array(feedEventSchema),
    nextCursor: z.string().describe('Pass it as `after` next time, also when the page is empty.'),
    hasMore: z.boolean().describe('True when further events are already there.'),
  })
  .meta({ id: 'FeedPage', description: 'Events in commit order; nothing is skipped.' });

export type FeedPage = z.infer<typeof feedPageSchema>;
