import type { Role } from '@spinassay/contract';
import { createLaboratory, issueAccessKey, openNoticeBoard, openStore, type Store } from '@spinassay/store';
import { createTestDatabase } from '@spinassay/store/test-support';
import { type ServedApi, serveApi } from './serve-api.ts';

/** How a test asks: `role` picks the key; absent means no key. */
export type Ask = {
  readonly role?: Role;
  readonly json?: unknown;
  readonly body?: string | Uint8Array;
  readonly headers?: Record<string, string>;
  readonly laboratory?: 'own' | 'foreign';
};

/** A served interface over a database of its own, with two laboratories. */
export type ApiFixture = ServedApi & {
  readonly connectionString: string;
  readonly store: Store;
  readonly laboratoryId: string;
  send(method: string, path: string, ask?: Ask): Promise<Response>;
};

/** Clone a database, open what `main.ts` opens, and serve. */
export async function openApiFixture(): Promise<ApiFixture> {
  const database = await createTestDatabase();
  const connection = { connectionString: database.connectionString, applicationName: 'api-test' };
  const store = openStore({ ...connection, poolSize: 4 });
  const notices = openNoticeBoard(connection);
  await notices.ready();
  const own = await createLaboratory(store, { name: 'cider cooperative' });
  const foreign = await createLaboratory(store, { name: 'another laboratory' });
  const tokenOf = keyring(store, { own: own.id, foreign: foreign.id });
  const served = await serveApi({ store, notices });
  return {
    ...served,
    connectionString: database.connectionString,
    store,
    laboratoryId: own.id,
    send: async (method, path, { role, json, body, headers, laboratory = 'own' } = {}) => {
      const authorization = role === undefined ? {} : { authorization: `Bearer ${await tokenOf(laboratory, role)}` };
      const type = json === undefined ? {} : { 'content-type': 'application/json' };
      const sent = json === undefined ? body : JSON.stringify(json);
      return fetch(served.baseUrl + path, {
        method,
        redirect: 'manual',
        headers: { ...type, ...authorization, ...headers },
        ...(sent === undefined ? {} : { body: sent }),
      });
    },
    close: async () => {
      await served.close();
      await notices.close();
      await store.close();
      await database.drop();
    },
  };
}

/** One key for each laboratory and role, issued when first needed. */
function keyring(store: Store, laboratories: Readonly<Record<'own' | 'foreign', string>>) {
  const tokens = new Map<string, Promise<string>>();
  return (whose: 'own' | 'foreign', role: Role): Promise<string> => {
    const name = `${whose} ${role}`;
    const known = tokens.get(name);
    if (known !== undefined) return known;
    const issued = issueAccessKey(store, { laboratoryId: laboratories[whose], roles: [role], label: name });
    const token = issued.then((key) => key.token);
    tokens.set(name, token);
    return token;
  };
}
