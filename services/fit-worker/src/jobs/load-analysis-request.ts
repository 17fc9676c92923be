import type { CompoundBody, Conditions, MethodBody, PreparationBody, ResultBody } from '@spinassay/contract';
import { sha256Hex } from '@spinassay/contract';
import {
  type Fence,
  type FitInputs,
  findDocument,
  type LaboratoryTransaction,
  loadFitInputs,
  type Store,
  type StoredDocument,
} from '@spinassay/store';
import type { AnalysisRequest } from '../analysis/analysis-request.ts';

/** What computes: the same for every fit of a process. */
export type EngineIdentity = { readonly engineVersion: string; readonly numericsId: string };

/**
 * Everything a fit refers to, at the versions it refers to, as the analysis takes it.
 *
 * Bodies were judged by the contract before they were stored, and their digests are over their bytes: they are read as what they were written as.
 */
export async function loadAnalysisRequest(
  store: Store,
  { laboratoryId, jobId }: Fence,
  identity: EngineIdentity,
): Promise<AnalysisRequest> {
  return store.withLaboratory(laboratoryId, async (transaction) => {
    const inputs = await loadFitInputs(transaction, jobId);
    const method = JSON.parse(inputs.method.bodyText) as MethodBody;
    const compounds = await findCompounds(transaction, method);
    return {
      samples: inputs.samples,
      dwellSeconds: inputs.acquisition.dwellSeconds,
      observeFrequencyMHz: inputs.acquisition.observeFrequencyMHz,
      conditions: JSON.parse(inputs.acquisition.conditions.effectiveText) as Conditions,
      method,
      compounds: Object.fromEntries(compounds.map(({ id, version, body }) => [id, { version, body }])),
      ...(inputs.preparation && { preparation: JSON.parse(inputs.preparation.bodyText) as PreparationBody }),
      seed: BigInt(inputs.fit.seed),
      inputs: namedByDigest(inputs, compounds),
      ...identity,
    };
  });
}

type LoadedCompound = Pick<StoredDocument, 'id' | 'version' | 'sha256'> & { readonly body: CompoundBody };

/** Panel first, then the reference; a compound that is both is loaded once. */
async function findCompounds(transaction: LaboratoryTransaction, method: MethodBody): Promise<LoadedCompound[]> {
  const found = new Map<string, LoadedCompound>();
  for (const { compoundId: id, compoundVersion: version } of [...method.panel, method.reference]) {
    if (found.has(id)) continue;
    // A method is stored with every version fixed, and versions never vanish.
    if (version === undefined) throw new Error(`the method leaves the version of ${id} open`);
    const document = await findDocument(transaction, { kind: 'compound', id, version });
    if (document === undefined) throw new Error(`the compound ${id} version ${version} has vanished`);
    found.set(id, { id, version, sha256: document.sha256, body: JSON.parse(document.bodyText) as CompoundBody });
  }
  return [...found.values()];
}

/** No ids and no times: the same contents have the same names in every laboratory. */
function namedByDigest(
  { acquisition, fit, method, preparation }: FitInputs,
  compounds: readonly LoadedCompound[],
): ResultBody['inputs'] {
  return {
    signalSha256: acquisition.signalSha256,
    conditionsSha256: acquisition.conditions.sha256,
    methodSha256: method.sha256,
    compoundSha256s: Object.fromEntries(compounds.map(({ id, sha256 }) => [id, sha256])),
    ...(preparation && { preparationSha256: preparation.sha256 }),
    optionsSha256: sha256Hex(fit.optionsText),
  };
}
