import type { Store } from '../sql-door.ts';
import { endAttempt, type Fence } from './fence.ts';

export type HandBack = {
  /** Wait before anybody takes it up again; absent or 0 keeps its place in the queue. */
  readonly delaySeconds?: number;
  /** True for an orderly shutdown: the attempt does not count against the job's maximum. */
  readonly isForgiven: boolean;
};

/**
 * Give a running job back to the queue, unharmed.
 *
 * @throws FencedError when the job is no longer this attempt's; nothing was written
 */
export async function handBack(store: Store, fence: Fence, { delaySeconds = 0, isForgiven }: HandBack): Promise<void> {
  await store.withLaboratory(fence.laboratoryId, (transaction) =>
    endAttempt(transaction, fence, { state: 'queued', outcome: 'handed-back', delaySeconds, isForgiven }),
  );
}
