import { openStore } from '@spinassay/store';
import { type ServedApi, serveApi } from './serve-api.ts';

/** Serve the interface over a database that refuses connections: port 9 (discard) listens nowhere here. */
export async function serveWithoutDatabase(): Promise<ServedApi> {
  const store = openStore({
    connectionString: 'postgresql://nobody@127.0.0.1:9/nowhere',
    applicationName: 'api-test',
    onConnectionFault: () => {},
  });
  const served = await serveApi({ store, notices: { watch: () => () => {} } });
  return {
    ...served,
    close: async () => {
      await served.close();
      await store.close();
    },
  };
}
