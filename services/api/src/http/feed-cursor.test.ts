import { expect, test } from 'vitest';
import { readFeedCursor, writeFeedCursor } from './feed-cursor.ts';

// The form is the house's own and opaque to clients.
test.each([0, 1, 17, 999_999_999_999_999])('reads back the cursor it wrote for %i', (sequence) => {
  expect(readFeedCursor(writeFeedCursor(sequence))).toBe(sequence);
});

test.each(['', '17', 'feed:17', 'ZmVlZDox ', 'ZmVlZDox=', Buffer.from('feed:01').toString('base64url'), '%%%'])(
  'does not take "%s" for a cursor',
  (text) => {
    expect(readFeedCursor(text)).toBeUndefined();
  },
);
