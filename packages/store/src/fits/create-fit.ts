import { writeAudit } from '../audit/write-audit.ts';
import { UnknownRowError } from '../one-row.ts';
import { type LaboratoryTransaction, sqlDoor } from '../sql-door.ts';
import { findFit } from './find-fit.ts';
import type { StoredFit } from './stored-fit.ts';

export type NewFit = {
  readonly acquisitionId: string;
  readonly conditionsVersion: number;
  readonly methodId: string;
  readonly methodVersion: number;
  readonly preparationId?: string;
  readonly preparationVersion?: number;
  readonly optionsText: string;
  readonly repeatReason?: string;
  /** SHA-256 in hex of all that makes two fits the same fit. */
  readonly naturalKey: string;
  readonly inputSha256: string;
  /** Unsigned 64-bit integer in decimal. */
  readonly seed: string;
  /** Attempts that may lose their worker before the fit is given up. */
  readonly maxAttempts?: number;
};

const maxAttemptsDefault = 5;
/** The fit that stood in the way may end between our two statements and free its place; more than a few times in a row is a bug. */
const roundCountMax = 5;

/**
 * Ask for a fit. Asking again while it is queued, running or completed gives the first one as `known`.
 *
 * @throws UnknownRowError when what it refers to is not held by the laboratory
 */
export async function createFit(
  transaction: LaboratoryTransaction,
  fit: NewFit,
): Promise<{ outcome: 'created' | 'known'; fit: StoredFit }> {
  for (let round = 0; round < roundCountMax; round += 1) {
    const id = await insertJob(transaction, fit);
    if (id !== undefined) {
      await insertFit(transaction, id, fit);
      await writeAudit(transaction[sqlDoor], {
        laboratoryId: transaction.laboratoryId,
        action: 'fit-asked',
        subject: id,
      });
    }
    const held = await findFit(transaction, id ?? (await findHolder(transaction, fit.naturalKey)) ?? nobody);
    if (held !== undefined) return { outcome: id === undefined ? 'known' : 'created', fit: held };
  }
  throw new UnknownRowError(`expected a fit for natural key ${fit.naturalKey}`);
}

/** No row has the nil UUID (RFC 9562 section 5.9). */
const nobody = '00000000-0000-0000-0000-000000000000';

/** The partial unique index decides who is first; a row that is just being written by another is waited for. */
async function insertJob(
  { laboratoryId, [sqlDoor]: sql }: LaboratoryTransaction,
  fit: NewFit,
): Promise<string | undefined> {
  const [row] = await sql.query<{ id: string }>(
    `insert into job (laboratory_id, kind, natural_key, max_attempts) values ($1, 'fit', $2, $3)
    on conflict (laboratory_id, kind, natural_key) where state not in ('failed', 'cancelled') do nothing returning id`,
    [laboratoryId, fit.naturalKey, fit.maxAttempts ?? maxAttemptsDefault],
  );
  return row?.id;
}

async function findHolder(
  { laboratoryId, [sqlDoor]: sql }: LaboratoryTransaction,
  naturalKey: string,
): Promise<string | undefined> {
  const [row] = await sql.query<{ id: string }>(
    `select id from job
    where laboratory_id = $1 and kind = 'fit' and natural_key = $2 and state not in ('failed', 'cancelled')`,
    [laboratoryId, naturalKey],
  );
  return row?.id;
}

async function insertFit(
  { laboratoryId, [sqlDoor]: sql }: LaboratoryTransaction,
  id: string,
  fit: NewFit,
): Promise<void> {
  try {
    await sql.query(
      `insert into fit (laboratory_id, id, acquisition_id, conditions_version, method_id, method_version, preparation_id,
        preparation_version, options_text, repeat_reason, input_sha256, seed)
      values ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12)`,
      [
        laboratoryId,
        id,
        fit.acquisitionId,
        fit.conditionsVersion,
        fit.methodId,
        fit.methodVersion,
        fit.preparationId ?? null,
        fit.preparationVersion ?? null,
        fit.optionsText,
        fit.repeatReason ?? null,
        fit.inputSha256,
        fit.seed,
      ],
    );
  } catch (error) {
    const isForeignKey = error instanceof Error && Reflect.get(error, 'code') === '23503';
    throw isForeignKey ? new UnknownRowError('the fit refers to something that is not held', { cause: error }) : error;
  }
}
