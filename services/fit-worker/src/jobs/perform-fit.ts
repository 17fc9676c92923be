import type { Logger } from '@spinassay/service-runtime';
import { type Fence, handBack, recordCancelled, recordCompleted, recordFailed, type Store } from '@spinassay/store';
import type { AnalysisThreads } from '../threads/analysis-threads.ts';
import { bePatient } from './be-patient.ts';
import { keepLease, type Lease } from './keep-lease.ts';
import { type EngineIdentity, loadAnalysisRequest } from './load-analysis-request.ts';
import { translateFailure } from './translate-failure.ts';

export type FitDependencies = {
  readonly store: Store;
  readonly threads: AnalysisThreads;
  readonly logger: Logger;
  readonly identity: EngineIdentity;
  readonly leaseSeconds: number;
  /** Aborts with a FitStopped when the process may not finish what it has begun. */
  readonly stopping: AbortSignal;
  /** Be called when somebody may want the fit cancelled; gives back what ends that. */
  watchCancellation(fitId: string, onNotice: () => void): () => void;
};

/** Carry one claimed fit to its end: load, compute, record. It never throws; what it cannot finish, the sweep gives to another. */
export async function performFit(fence: Fence, dependencies: FitDependencies): Promise<void> {
  const { store, leaseSeconds, logger } = dependencies;
  const fields = { fitId: fence.jobId, attempt: fence.attempt };
  const onTrouble = (error: unknown): void => logger.warn({ ...fields, err: error }, 'database-was-away');
  const lease = keepLease({ store, fence, leaseSeconds, onTrouble });
  const unwatch = dependencies.watchCancellation(fence.jobId, lease.look);
  // Whoever asked between the claim and the watch is heard now.
  lease.look();
  try {
    await finish(fence, { ...dependencies, lease, onTrouble });
  } catch (error) {
    await endWithout(error, fence, { ...dependencies, onTrouble }).catch((second: unknown) =>
      logger.error({ ...fields, err: second }, 'fit-left-to-the-sweep'),
    );
  } finally {
    unwatch();
    lease.stop();
  }
}

type Finish = FitDependencies & { readonly lease: Lease; readonly onTrouble: (error: unknown) => void };

async function finish(fence: Fence, dependencies: Finish): Promise<void> {
  const { store, threads, logger, identity, lease, onTrouble } = dependencies;
  const startedAt = performance.now();
  const request = await bePatient(() => loadAnalysisRequest(store, fence, identity), { onTrouble });
  const loadedAt = performance.now();
  const signal = AbortSignal.any([lease.signal, dependencies.stopping]);
  const outcome = await threads.analyse(request, { signal, onProgress: lease.tell });
  const timings = {
    loadSeconds: (loadedAt - startedAt) / 1_000,
    computeSeconds: (performance.now() - loadedAt) / 1_000,
  };
  await bePatient(() => recordCompleted(store, fence, { ...outcome, ...identity, timings }), { onTrouble });
  const { recommendation, resultSha256 } = outcome;
  logger.info({ fitId: fence.jobId, attempt: fence.attempt, recommendation, resultSha256, ...timings }, 'fit-recorded');
}

type Ending = Pick<FitDependencies, 'store' | 'logger'> & { readonly onTrouble: (error: unknown) => void };

async function endWithout(error: unknown, fence: Fence, { store, logger, onTrouble }: Ending): Promise<void> {
  const decision = translateFailure(error);
  const fields = { fitId: fence.jobId, attempt: fence.attempt };
  switch (decision.act) {
    case 'fail':
      logger.error({ ...fields, err: error, problem: decision.problem.slug }, 'fit-failed');
      return bePatient(() => recordFailed(store, fence, { problem: decision.problem }), { onTrouble });
    case 'hand-back':
      logger.warn({ ...fields, err: error }, 'fit-handed-back');
      return bePatient(() => handBack(store, fence, decision), { onTrouble });
    case 'cancel':
      logger.info(fields, 'fit-cancelled');
      return bePatient(() => recordCancelled(store, fence), { onTrouble });
    case 'leave':
      return logger.warn({ ...fields, err: error }, 'fit-taken-away');
  }
}
