import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { createLogger } from '@spinassay/service-runtime';
import type { ApiDependencies } from '../src/api-dependencies.ts';
import { createApi } from '../src/create-api.ts';

/** An interface on loopback, on a port of the system's choice. */
export type ServedApi = {
  readonly baseUrl: string;
  readonly draining: AbortController;
  /** Times the bell was rung; the bell is a counter here, since it carries no work. */
  ringCount(): number;
  /** Every line that was logged. */
  logText(): string;
  close(): Promise<void>;
};

/** Serve the interface over this store; `main.ts` does the same with what it opened itself. */
export async function serveApi({ store, notices }: Pick<ApiDependencies, 'store' | 'notices'>): Promise<ServedApi> {
  const draining = new AbortController();
  const log: string[] = [];
  let rings = 0;
  const server = createServer();
  const baseUrl = (): string => `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const logger = createLogger({ service: 'api', destination: { write: (line) => void log.push(line) } });
  const bell = {
    ring: async (): Promise<void> => {
      rings += 1;
    },
  };
  server.on('request', createApi({ store, bell, notices, logger, baseUrl, draining: draining.signal }));
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return {
    baseUrl: baseUrl(),
    draining,
    ringCount: () => rings,
    logText: () => log.join(''),
    close: async () => {
      server.closeAllConnections();
      await new Promise<void>((resolve) => server.close(() => resolve()));
    },
  };
}
