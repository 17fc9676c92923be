import { Client } from 'pg';
import { advisoryClass, connectionSettings } from '../connection-settings.ts';
import { isStoreUnavailable } from '../is-store-unavailable.ts';
import { oneRow } from '../one-row.ts';

export type WorkerDescription = {
  /** For an operator: which machine, which process. */
  readonly label: string;
  readonly wantedConcurrency: number;
};

/** A worker as the database sees it: alive for as long as this connection holds its advisory lock. */
export type WorkerSession = {
  readonly workerId: string;
  /**
   * Resolves when the connection is lost (never after `close`): the sweep will give the jobs to others. Open another session;
   * unfinished work is fenced.
   */
  readonly lost: Promise<Error>;
  /** Say how many jobs run, and hear how many should. */
  heartbeat(news: { readonly actualConcurrency: number }): Promise<{ wantedConcurrency: number }>;
  /** Leave in good order. */
  close(): Promise<void>;
};

/** Register a worker and take the lock that shows it is alive. */
export async function openWorkerSession(
  address: { readonly connectionString: string; readonly applicationName: string },
  { label, wantedConcurrency }: WorkerDescription,
): Promise<WorkerSession> {
  const client = new Client(connectionSettings(address));
  let isClosing = false;
  const lost = new Promise<Error>((resolve) => {
    const tell = (error: Error) => void (isClosing || resolve(error));
    client.on('error', tell);
    client.on('end', () => tell(new Error('the connection of the worker session ended')));
  });
  await client.connect();
  try {
    const workerId = await register(client, label, wantedConcurrency);
    return {
      workerId,
      lost,
      heartbeat: ({ actualConcurrency }) => beat(client, workerId, actualConcurrency),
      close: () => {
        isClosing = true;
        return leave(client, workerId);
      },
    };
  } catch (error) {
    isClosing = true;
    await client.end();
    throw error;
  }
}

async function register(client: Client, label: string, wantedConcurrency: number): Promise<string> {
  const { rows } = await client.query<{ id: string; advisory_key: number }>(
    'insert into worker (label, wanted_concurrency) values ($1, $2) returning id, advisory_key',
    [label, wantedConcurrency],
  );
  const { id, advisory_key: advisoryKey } = oneRow(rows, 'worker');
  await client.query('select pg_advisory_lock($1, $2)', [advisoryClass.worker, advisoryKey]);
  return id;
}

async function beat(
  client: Client,
  workerId: string,
  actualConcurrency: number,
): Promise<{ wantedConcurrency: number }> {
  const { rows } = await client.query<{ wanted_concurrency: number }>(
    `update worker set heartbeat_at = clock_timestamp(), actual_concurrency = $2 where id = $1 returning wanted_concurrency`,
    [workerId, actualConcurrency],
  );
  return { wantedConcurrency: oneRow(rows, `worker ${workerId}`).wanted_concurrency };
}

async function leave(client: Client, workerId: string): Promise<void> {
  try {
    await client.query('update worker set ended_at = clock_timestamp(), actual_concurrency = 0 where id = $1', [
      workerId,
    ]);
  } catch (error) {
    // Without its connection the worker counts as gone already; leaving must not fail for that.
    if (!isStoreUnavailable(error)) throw error;
  } finally {
    await client.end();
  }
}
