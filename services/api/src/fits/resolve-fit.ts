import { canonicalJson, type FitPost, type MethodBody, type PreparationBody, sha256Hex } from '@spinassay/contract';
import { jsonPointer, ProblemError, type ProblemFault } from '@spinassay/problems';
import {
  type DocumentKind,
  findAcquisition,
  findDocument,
  type LaboratoryTransaction,
  type StoredAcquisition,
  type StoredDocument,
} from '@spinassay/store';
import { problemWithFaults } from '../http/problem-with-faults.ts';

/** Every input of a fit in the version it will be computed with. */
export type FitReferences = {
  readonly acquisition: StoredAcquisition;
  readonly method: StoredDocument;
  readonly preparation?: StoredDocument;
  /** By compound id: digest of the version that the method fixed. */
  readonly compoundSha256s: Readonly<Record<string, string>>;
  readonly optionsText: string;
  readonly optionsSha256: string;
};

/**
 * Find what a fit names, the latest version where it names none.
 *
 * @throws ProblemError unknown-reference pointing at everything that is not there; invalid-body when the standard
 *   in the tube is not the one the method rests on
 */
export async function resolveFit(transaction: LaboratoryTransaction, post: FitPost): Promise<FitReferences> {
  const faults: ProblemFault[] = [];
  const acquisition = await findAcquisition(transaction, post.acquisitionId);
  if (acquisition === undefined) faults.push(missing('acquisitionId', `there is no acquisition ${post.acquisitionId}`));
  const method = await find('method', post.methodId, post.methodVersion);
  const preparation =
    post.preparationId === undefined
      ? undefined
      : await find('preparation', post.preparationId, post.preparationVersion);
  if (acquisition === undefined || method === undefined || faults.length > 0) {
    throw new ProblemError({ slug: 'unknown-reference', detail: 'The fit names what is not there.', errors: faults });
  }
  checkStandard(method, preparation);
  const optionsText = canonicalJson(post.options ?? {});
  return {
    acquisition,
    method,
    ...(preparation === undefined ? {} : { preparation }),
    compoundSha256s: await compoundDigests(transaction, method),
    optionsText,
    optionsSha256: sha256Hex(optionsText),
  };

  async function find(
    kind: DocumentKind,
    id: string,
    version: number | undefined,
  ): Promise<StoredDocument | undefined> {
    const found = await findDocument(transaction, { kind, id, ...(version === undefined ? {} : { version }) });
    const which = version === undefined ? '' : ` in version ${version}`;
    if (found === undefined) faults.push(missing(`${kind}Id`, `there is no ${kind} "${id}"${which}`));
    return found;
  }
}

function missing(member: string, detail: string): ProblemFault {
  return { pointer: jsonPointer([member]), detail };
}

/** Amounts against a standard that is not in the tube would be amounts of nothing. */
function checkStandard(method: StoredDocument, preparation: StoredDocument | undefined): void {
  const wanted = (JSON.parse(method.bodyText) as MethodBody).standard?.compoundId;
  if (wanted === undefined || preparation === undefined) return;
  const held = (JSON.parse(preparation.bodyText) as PreparationBody).standard.compoundId;
  if (held === wanted) return;
  const detail = `the preparation holds "${held}"; the method's standard is "${wanted}"`;
  const faults = [{ pointer: '#/preparationId', detail }];
  throw problemWithFaults({ slug: 'invalid-body', subject: 'The body', faults });
}

async function compoundDigests(
  transaction: LaboratoryTransaction,
  method: StoredDocument,
): Promise<Record<string, string>> {
  const { panel, reference } = JSON.parse(method.bodyText) as MethodBody;
  const digests: Record<string, string> = {};
  for (const { compoundId, compoundVersion } of [...panel, reference]) {
    // Methods are stored with every version fixed, and versions never vanish.
    if (compoundVersion === undefined)
      throw new Error(`method ${method.id} v${method.version} leaves ${compoundId} open`);
    const compound = await findDocument(transaction, { kind: 'compound', id: compoundId, version: compoundVersion });
    if (compound === undefined) throw new Error(`compound ${compoundId} v${compoundVersion} has vanished`);
    digests[compoundId] = compound.sha256;
  }
  return digests;
}
