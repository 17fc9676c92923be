export { analyseAcquisition } from './analysis/analyse-acquisition.ts';
export type { AnalysisHooks, AnalysisRequest } from './analysis/analysis-request.ts';
export { createFitWorker, type FitWorker, type FitWorkerOptions } from './create-fit-worker.ts';
export { engineVersion } from './identity/engine-version.ts';
export { numericsId } from './identity/numerics-id.ts';
export type { EngineIdentity } from './jobs/load-analysis-request.ts';
export { type AnalysisThreads, createAnalysisThreads } from './threads/analysis-threads.ts';
