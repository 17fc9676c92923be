import { canonicalJson, sha256Hex } from '@spinassay/contract';
import { claimNext, openWorkerSession, recordCompleted, recordFailed, type WorkerSession } from '@spinassay/store';
import type { ApiFixture } from './api-fixture.ts';

/** What a worker would have recorded; only the bytes matter here, they are no result of any analysis. */
export const recordedText = canonicalJson({ note: 'recorded by a test', shift: 1e-7 });

/** Do with the oldest queued fit what a worker does: claim it and record an outcome. */
export async function finishFit(api: ApiFixture, outcome: 'completed' | 'failed'): Promise<void> {
  const session = await openSession(api);
  try {
    const claim = await claimNext(api.store, { workerId: session.workerId, kinds: ['fit'], leaseSeconds: 30 });
    if (claim === undefined) throw new Error('no fit is queued');
    if (outcome === 'completed') {
      await recordCompleted(api.store, claim.fence, {
        resultText: recordedText,
        resultSha256: sha256Hex(recordedText),
        engineVersion: '0.0.0',
        numericsId: 'test',
        recommendation: 'held',
      });
    } else {
      const problem = { slug: 'analysis-not-possible', detail: 'the compound has too many coupled protons' } as const;
      await recordFailed(api.store, claim.fence, { problem });
    }
  } finally {
    await session.close();
  }
}

async function openSession({ connectionString }: ApiFixture): Promise<WorkerSession> {
  const connection = { connectionString, applicationName: 'api-test-worker' };
  return openWorkerSession(connection, { label: 'test', wantedConcurrency: 1 });
}
