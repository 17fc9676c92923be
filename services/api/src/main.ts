// The program: parse the configuration, open what is needed, serve until told to stop.
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { createBell } from '@spinassay/job-queue';
import {
  choiceSetting,
  createLogger,
  integerSetting,
  logLevels,
  optionalTextSetting,
  parseConfiguration,
  superviseShutdown,
  textSetting,
} from '@spinassay/service-runtime';
import { openNoticeBoard, openStore } from '@spinassay/store';
import { createApi } from './create-api.ts';

const configuration = parseConfiguration(
  {
    port: integerSetting({ key: 'PORT', default: 8480, min: 0, max: 65_535 }),
    host: textSetting({ key: 'SPINASSAY_HOST', default: '127.0.0.1' }),
    databaseUrl: textSetting({ key: 'DATABASE_URL', isSecret: true }),
    // Where clients reach the service, when that is not where it listens: behind a proxy, under a name.
    publicUrl: optionalTextSetting({ key: 'SPINASSAY_BASE_URL' }),
    logLevel: choiceSetting({ key: 'SPINASSAY_LOG_LEVEL', choices: logLevels, default: 'info' }),
  },
  process.env,
);
const logger = createLogger({ service: 'api', level: configuration.logLevel });
const onFault = (error: Error): void => logger.warn({ err: error }, 'database-connection-lost');
const connection = { connectionString: configuration.databaseUrl, applicationName: 'spinassay-api' };

const store = openStore({ ...connection, onConnectionFault: onFault });
const bell = createBell({ ...connection, onFault });
const notices = openNoticeBoard({ ...connection, onConnectionFault: onFault });
const draining = new AbortController();

const server = createServer();
// Kept from the moment of listening, since a server that drains has no address any more.
let localUrl = '';
const baseUrl = (): string => configuration.publicUrl ?? localUrl;
server.on('request', createApi({ store, bell, notices, logger, baseUrl, draining: draining.signal }));
server.on('error', (error) => {
  logger.error({ err: error, port: configuration.port }, 'api-cannot-listen');
  process.exit(1);
});
server.listen(configuration.port, configuration.host, () => {
  localUrl = `http://${configuration.host}:${(server.address() as AddressInfo).port}`;
  logger.info({ baseUrl: baseUrl() }, 'api-listening');
  // The launcher learns the port from here, since 0 lets the system choose one.
  process.send?.({ event: 'api-listening', baseUrl: baseUrl() });
});

superviseShutdown({
  logger,
  drain: async () => {
    // Whoever waits for a fit is answered now; then nobody new is let in and the last request is finished.
    draining.abort();
    await new Promise<void>((resolve) => server.close(() => resolve()));
    await Promise.all([bell.close(), notices.close()]);
    await store.close();
  },
});
