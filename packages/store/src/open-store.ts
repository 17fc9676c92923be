import { Pool, type PoolClient } from 'pg';
import { connectionSettings } from './connection-settings.ts';
import { sendNotices } from './notices/send-notices.ts';
import { retryConflicts } from './retry-conflicts.ts';
import { type LaboratoryTransaction, type Notice, type Sql, type Store, sqlDoor } from './sql-door.ts';

export type StoreOptions = {
  readonly connectionString: string;
  /** Name of the process in the server's list of connections. */
  readonly applicationName: string;
  /** Connections at most; the default of 6 is what the budget of the README counts with. */
  readonly poolSize?: number;
  /** Told of connections that were lost while idle; the pool opens others. */
  readonly onConnectionFault?: (error: Error) => void;
};

/** Open the store. Connections are made when they are first needed, so this never fails. */
export function openStore(options: StoreOptions): Store {
  const onFault = options.onConnectionFault ?? (() => {});
  const pool = new Pool({ ...connectionSettings(options), max: options.poolSize ?? 6, allowExitOnIdle: true });
  // Without a listener a lost idle connection would end the process.
  pool.on('error', onFault);
  pool.on('connect', (client) => client.on('error', onFault));

  const transaction: Store[typeof sqlDoor]['transaction'] = (work) =>
    retryConflicts(() => runTransaction(pool, onFault, undefined, work));
  return {
    withLaboratory: (laboratoryId, work) =>
      retryConflicts(() =>
        runTransaction(pool, onFault, laboratoryId, (sql) => work(laboratoryTransaction(laboratoryId, sql))),
      ),
    close: () => pool.end(),
    [sqlDoor]: {
      query: async (text, values = []) => (await pool.query(text, [...values])).rows,
      transaction,
      notify: (notices) => sendNotices(pool, notices).catch(onFault),
    },
  };
}

function laboratoryTransaction(laboratoryId: string, sql: Sql & { readonly notices: Notice[] }): LaboratoryTransaction {
  return { laboratoryId, [sqlDoor]: sql };
}

type OnFault = (error: Error) => void;
type Work<T> = (sql: Sql & { readonly notices: Notice[] }) => Promise<T>;

async function runTransaction<T>(
  pool: Pool,
  onFault: OnFault,
  laboratoryId: string | undefined,
  work: Work<T>,
): Promise<T> {
  const client = await pool.connect();
  const notices: Notice[] = [];
  let fault: Error | undefined;
  try {
    await client.query('begin isolation level read committed');
    if (laboratoryId !== undefined) await client.query("select set_config('app.lab', $1, true)", [laboratoryId]);
    const outcome = await work({
      query: async (text, values = []) => (await client.query(text, [...values])).rows,
      notices,
    });
    await client.query('commit');
    // After the commit: a notice inside the transaction costs three quarters of the writes (707 against 3,127 a second).
    await sendNotices(client, notices).catch(onFault);
    return outcome;
  } catch (error) {
    fault = await rollBack(client);
    throw error;
  } finally {
    client.release(fault);
  }
}

/** @returns the error that makes this connection unfit for others, if there is one */
async function rollBack(client: PoolClient): Promise<Error | undefined> {
  try {
    await client.query('rollback');
    return undefined;
  } catch (error) {
    // The connection is gone and the server rolls back by itself; the first error is the one to tell.
    return error instanceof Error ? error : new Error(String(error));
  }
}
