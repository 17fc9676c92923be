import type { ProblemRecord } from '@spinassay/problems';

/** `queued` and `running` may change; the other three are final. */
export type JobState = 'queued' | 'running' | 'completed' | 'failed' | 'cancelled';

/** One analysis and how far it is. */
export type StoredFit = {
  readonly id: string;
  readonly state: JobState;
  readonly stage?: string;
  readonly fraction?: number;
  readonly attempt: number;
  readonly cancelRequested: boolean;
  readonly acquisitionId: string;
  readonly conditionsVersion: number;
  readonly methodId: string;
  readonly methodVersion: number;
  readonly preparationId?: string;
  readonly preparationVersion?: number;
  readonly optionsText: string;
  readonly repeatReason?: string;
  readonly inputSha256: string;
  /** Unsigned 64-bit integer in decimal. */
  readonly seed: string;
  readonly resultSha256?: string;
  readonly problem?: ProblemRecord;
  readonly createdAt: string;
  readonly finishedAt?: string;
  /** Rises with every change that a reader sees; renewing a lease without news does not raise it. */
  readonly revision: number;
};

export type FitRow = {
  id: string;
  state: JobState;
  stage: string | null;
  fraction: number | null;
  attempt: number;
  cancel_requested: boolean;
  acquisition_id: string;
  conditions_version: number;
  method_id: string;
  method_version: number;
  preparation_id: string | null;
  preparation_version: number | null;
  options_text: string;
  repeat_reason: string | null;
  input_sha256: string;
  seed: string;
  result_sha256: string | null;
  problem: string | null;
  created_at: Date;
  finished_at: Date | null;
  revision: number;
};

export function storedFit(row: FitRow): StoredFit {
  return {
    id: row.id,
    state: row.state,
    attempt: row.attempt,
    cancelRequested: row.cancel_requested,
    acquisitionId: row.acquisition_id,
    conditionsVersion: row.conditions_version,
    methodId: row.method_id,
    methodVersion: row.method_version,
    optionsText: row.options_text,
    inputSha256: row.input_sha256,
    seed: row.seed,
    createdAt: row.created_at.toISOString(),
    revision: row.revision,
    ...whatIsThere(row),
  };
}

/** Absent is absent: a column that is null has no member. */
function whatIsThere(row: FitRow): Partial<StoredFit> {
  return {
    ...(row.stage === null ? {} : { stage: row.stage }),
    ...(row.fraction === null ? {} : { fraction: row.fraction }),
    ...(row.preparation_id === null ? {} : { preparationId: row.preparation_id }),
    ...(row.preparation_version === null ? {} : { preparationVersion: row.preparation_version }),
    ...(row.repeat_reason === null ? {} : { repeatReason: row.repeat_reason }),
    ...(row.result_sha256 === null ? {} : { resultSha256: row.result_sha256 }),
    // Written by this room from a ProblemRecord and never changed since: final rows are frozen by the database.
    ...(row.problem === null ? {} : { problem: JSON.parse(row.problem) as ProblemRecord }),
    ...(row.finished_at === null ? {} : { finishedAt: row.finished_at.toISOString() }),
  };
}
