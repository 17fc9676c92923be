import type { Bell } from '@spinassay/job-queue';
import type { Logger } from '@spinassay/service-runtime';
import type { NoticeBoard, Store } from '@spinassay/store';

/** Everything the handlers reach the world through. Nothing else is global. */
export type ApiDependencies = {
  readonly store: Store;
  /** Rung after a fit is committed; it carries no work and may fail. */
  readonly bell: Pick<Bell, 'ring'>;
  readonly notices: Pick<NoticeBoard, 'watch'>;
  readonly logger: Logger;
  /** Scheme, host and port that type URIs of problems start with; asked each time, since a port may be chosen late. */
  readonly baseUrl: () => string;
  /** Aborted when the service drains: whoever waits for a fit is answered at once. */
  readonly draining: AbortSignal;
};
