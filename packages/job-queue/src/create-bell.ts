import { randomUUID } from 'node:crypto';
import { createPostgresBackend, type PgPool, withBackend } from 'bullmq';
import { Pool } from 'pg';
import { bellName, bellSchema } from './bell-schema.ts';

export type BellOptions = {
  readonly connectionString: string;
  /** Name of the process in the server's list of connections. */
  readonly applicationName: string;
  /** Told of lost connections and failed rings; the bell goes on by itself. */
  readonly onFault: (error: Error) => void;
};

/** Wakes workers. It carries no work and decides nothing: losing every ring loses no work, because the store's sweep rings again. */
export type Bell = {
  /** Wake one listener. Call it after the commit. */
  ring(): Promise<void>;
  /** Be called at each ring, one at a time. Resolves once this process listens. */
  listen(onRing: () => void | Promise<void>): Promise<void>;
  close(): Promise<void>;
};

/** Payloads hold nothing but the version of their own shape. */
const payload = { version: 1 };

/**
 * Connections of one bell. Under 200 rings at once (the test beside this file counts them in pg_stat_activity) a listening process used 3,
 * one of them for LISTEN, and a ringing one whatever it was given: 3 are enough for both.
 */
const poolSize = 3;

const { Queue, Worker } = withBackend(createPostgresBackend);
type BellQueue = ReturnType<typeof openQueue>;
type BellWorker = ReturnType<typeof openWorker>;

/** Make the bell of this process. It connects when it is first rung or listened to. */
export function createBell({ connectionString, applicationName, onFault }: BellOptions): Bell {
  const pool = new Pool({
    connectionString,
    application_name: applicationName,
    options: `-c search_path=${bellSchema}`,
    max: poolSize,
    connectionTimeoutMillis: 5_000,
    keepAlive: true,
  });
  pool.on('error', onFault);
  pool.on('connect', (client) => client.on('error', onFault));
  // Both packages describe the same object; their overloads of `on` do not meet.
  const connection = pool as unknown as PgPool;
  let queue: BellQueue | undefined;
  let worker: BellWorker | undefined;
  return {
    ring: async () => {
      queue ??= openQueue(connection, onFault);
      await queue.add('ring', payload, { jobId: randomUUID() });
    },
    listen: async (onRing) => {
      if (worker !== undefined) throw new Error('this bell is listened to already');
      worker = openWorker(connection, onFault, onRing);
      await worker.waitUntilReady();
    },
    close: async () => {
      await worker?.close();
      await queue?.close();
      await pool.end();
    },
  };
}

function openQueue(connection: PgPool, onFault: (error: Error) => void) {
  // One attempt, nothing kept: a kept ring would swallow the next one of its id, and a retried one would ring for nothing.
  const defaultJobOptions = { attempts: 1, removeOnComplete: true, removeOnFail: true };
  const queue = new Queue(bellName, { connection, defaultJobOptions });
  queue.on('error', onFault);
  return queue;
}

function openWorker(connection: PgPool, onFault: (error: Error) => void, onRing: () => void | Promise<void>) {
  const worker = new Worker(bellName, async () => onRing(), { connection });
  worker.on('error', onFault);
  worker.on('failed', (_job, error) => onFault(error));
  return worker;
}
