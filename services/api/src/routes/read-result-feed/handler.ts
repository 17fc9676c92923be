import { type FeedEvent, type FeedPage, feedLimits, feedQuerySchema, operations } from '@spinassay/contract';
import { ProblemError } from '@spinassay/problems';
import { type FeedRow, readFeed } from '@spinassay/store';
import type { Handler } from '../../http/answer.ts';
import { authorise } from '../../http/authorise.ts';
import { readFeedCursor, writeFeedCursor } from '../../http/feed-cursor.ts';
import { parseQuery } from '../../http/parse-query.ts';

/** `GET /v1/results`: what happened to results since a cursor, in commit order, nothing skipped. */
export const readResultFeed: Handler = async (request, dependencies) => {
  const principal = await authorise(request, operations.readResultFeed, dependencies);
  const query = parseQuery(feedQuerySchema, request);
  const after = query.after === undefined ? 0 : sequenceOf(query.after);
  const limit = query.limit ?? feedLimits.usual;
  const rows = await dependencies.store.withLaboratory(principal.laboratoryId, (transaction) =>
    // One more than is shown says whether there is more.
    readFeed(transaction, { after, limit: limit + 1 }),
  );
  const shown = rows.slice(0, limit);
  const page: FeedPage = {
    events: shown.map(eventOf),
    nextCursor: writeFeedCursor(shown.at(-1)?.sequence ?? after),
    hasMore: rows.length > limit,
  };
  return { status: 200, headers: { 'Cache-Control': 'private, no-cache' }, json: page };
};

function sequenceOf(cursor: string): number {
  const sequence = readFeedCursor(cursor);
  if (sequence === undefined) {
    const errors = [{ parameter: 'after', detail: 'expected a cursor of this feed, as it was given' }];
    throw new ProblemError({ slug: 'invalid-query', detail: 'The cursor is not one of this feed.', errors });
  }
  return sequence;
}

function eventOf({ sequence, ...row }: FeedRow): FeedEvent {
  return { cursor: writeFeedCursor(sequence), ...row };
}
