// The program: parse the configuration, open what is needed, take jobs until told to stop.
import { availableParallelism, hostname, setPriority } from 'node:os';
import { createBell } from '@spinassay/job-queue';
import {
  choiceSetting,
  createLogger,
  integerSetting,
  logLevels,
  parseConfiguration,
  superviseShutdown,
  textSetting,
} from '@spinassay/service-runtime';
import { openNoticeBoard, openStore, openWorkerSession } from '@spinassay/store';
import { createFitWorker } from './create-fit-worker.ts';
import { engineVersion } from './identity/engine-version.ts';
import { numericsId } from './identity/numerics-id.ts';
import { createAnalysisThreads } from './threads/analysis-threads.ts';

const configuration = parseConfiguration(
  {
    databaseUrl: textSetting({ key: 'DATABASE_URL', isSecret: true }),
    // One core is left to the API, the database and our own event loop.
    concurrency: integerSetting({
      key: 'SPINASSAY_FIT_CONCURRENCY',
      default: Math.max(1, availableParallelism() - 1),
      min: 1,
      max: 256,
    }),
    logLevel: choiceSetting({ key: 'SPINASSAY_LOG_LEVEL', choices: logLevels, default: 'info' }),
  },
  process.env,
);
// Before any thread is started: they inherit it. Beside a worker of priority 10 the API's p99 was half (14.4 to 7.3 ms).
setPriority(10);

const { concurrency } = configuration;
const logger = createLogger({ service: 'fit-worker', level: configuration.logLevel });
const onFault = (error: Error): void => logger.warn({ err: error }, 'database-connection-lost');
const connection = { connectionString: configuration.databaseUrl, applicationName: 'spinassay-fit-worker' };
const identity = { engineVersion: engineVersion(), numericsId: numericsId() };

const store = openStore({ ...connection, onConnectionFault: onFault });
const bell = createBell({ ...connection, onFault });
const notices = openNoticeBoard({ ...connection, onConnectionFault: onFault });
const threads = createAnalysisThreads({
  entry: new URL('./threads/entry.js', import.meta.url),
  readyCount: concurrency,
});
// Threads that cannot start would fail every fit they are given.
await threads.ready().catch((error: unknown) => {
  logger.error({ err: error }, 'threads-cannot-start');
  process.exit(1);
});
const worker = createFitWorker({
  store,
  bell,
  notices,
  threads,
  logger,
  identity,
  concurrency,
  openSession: () =>
    openWorkerSession(connection, { label: `${hostname()} ${process.pid}`, wantedConcurrency: concurrency }),
  onReady: () => {
    logger.info({ concurrency, ...identity }, 'fit-worker-ready');
    process.send?.({ event: 'fit-worker-ready' });
  },
});

superviseShutdown({
  logger,
  drain: async () => {
    await worker.drain();
    await Promise.all([bell.close(), notices.close(), threads.close()]);
    await store.close();
  },
});
