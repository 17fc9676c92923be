import { starterCatalogue } from '@spinassay/compound-catalogue';
import { canonicalJson, roles, sha256Hex } from '@spinassay/contract';
import {
  authenticate,
  createDocumentVersion,
  createLaboratory,
  issueAccessKey,
  listLaboratories,
  listLatestDocuments,
  openStore,
} from '@spinassay/store';

/**
 * See to it that there is a laboratory with compounds to start from and one working key a role.
 *
 * Each step looks for itself whether it is due: a start that was cut off is finished by the next one, and what a laboratory has made
 * of its compounds since is never touched.
 *
 * @param {{databaseUrl: string, keys?: Record<string, string>}} given keys as the access file had them
 * @returns {Promise<{keys: Record<string, string>, isNew: boolean, compoundCount: number, issuedCount: number}>}
 */
export async function furnishLaboratory({ databaseUrl, keys: given = {} }) {
  const store = openStore({ connectionString: databaseUrl, applicationName: 'spinassay-launcher', poolSize: 2 });
  try {
    const [found] = await listLaboratories(store);
    const { id: laboratoryId } = found ?? (await createLaboratory(store, { name: 'My laboratory' }));
    const compoundCount = await store.withLaboratory(laboratoryId, loadCatalogueOnce);
    const { keys, issuedCount } = await keepKeys(store, { laboratoryId, given });
    return { keys, issuedCount, compoundCount, isNew: found === undefined };
  } finally {
    await store.close();
  }
}

/** All or nothing: it is one transaction. */
async function loadCatalogueOnce(transaction) {
  const held = await listLatestDocuments(transaction, 'compound');
  if (held.length > 0) return held.length;
  const entries = starterCatalogue();
  for (const { id, body } of entries) {
    const bodyText = canonicalJson(body);
    await createDocumentVersion(transaction, {
      kind: 'compound',
      id,
      name: body.name,
      bodyText,
      sha256: sha256Hex(bodyText),
    });
  }
  return entries.length;
}

async function keepKeys(store, { laboratoryId, given }) {
  const keys = {};
  let issuedCount = 0;
  for (const role of roles) {
    if (await isWorking(store, { token: given[role], role, laboratoryId })) {
      keys[role] = given[role];
      continue;
    }
    keys[role] = (await issueAccessKey(store, { laboratoryId, roles: [role], label: `local ${role}` })).token;
    issuedCount += 1;
  }
  return { keys, issuedCount };
}

async function isWorking(store, { token, role, laboratoryId }) {
  const principal = typeof token === 'string' ? await authenticate(store, token) : undefined;
  return principal !== undefined && principal.laboratoryId === laboratoryId && principal.roles.includes(role);
}
