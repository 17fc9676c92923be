import type { Notice } from '../sql-door.ts';

/** The one channel; what a notice is about stands in its payload, `topic:id`. */
export const noticeChannel = 'spinassay_notice';

type Queryable = { query(text: string, values: unknown[]): Promise<unknown> };

/** Wake whoever waits for these notices; equal ones go out once. */
export async function sendNotices(connection: Queryable, notices: readonly Notice[]): Promise<void> {
  if (notices.length === 0) return;
  const payloads = [...new Set(notices.map(({ topic, id }) => `${topic}:${id}`))];
  await connection.query('select pg_notify($1, payload) from unnest($2::text[]) as payload', [noticeChannel, payloads]);
}
