import type { CompoundBody, MethodBody } from '@spinassay/contract';
import { jsonPointer, ProblemError, type ProblemFault } from '@spinassay/problems';
import { findDocument, type LaboratoryTransaction } from '@spinassay/store';

/**
 * Fix the version of every compound that a method names, so that the method means the same for ever.
 * A reference that is also in the panel is one compound in one tube, hence one version.
 *
 * @throws ProblemError unknown-reference pointing at every compound, version and group that is not there
 */
export async function resolveMethod(transaction: LaboratoryTransaction, body: MethodBody): Promise<MethodBody> {
  const faults: ProblemFault[] = [];
  const panel: MethodBody['panel'] = [];
  for (const [index, entry] of body.panel.entries()) {
    const compound = await findCompound(transaction, entry, ['panel', index], faults);
    faults.push(...groupFaults(entry.quantifierGroups ?? [], compound, index));
    panel.push({ ...entry, ...(compound === undefined ? {} : { compoundVersion: compound.version }) });
  }
  const inPanel = panel.find(({ compoundId }) => compoundId === body.reference.compoundId);
  const wanted = {
    ...(inPanel?.compoundVersion === undefined ? {} : { compoundVersion: inPanel.compoundVersion }),
    ...body.reference,
  };
  const reference = await findCompound(transaction, wanted, ['reference'], faults);
  if (
    reference !== undefined &&
    inPanel?.compoundVersion !== undefined &&
    inPanel.compoundVersion !== reference.version
  ) {
    const detail = `the panel has version ${inPanel.compoundVersion} of the same compound`;
    faults.push({ pointer: jsonPointer(['body', 'reference', 'compoundVersion']), detail });
  }
  if (reference === undefined || faults.length > 0) {
    throw new ProblemError({
      slug: 'unknown-reference',
      detail: 'The method names what is not there.',
      errors: faults,
    });
  }
  return { ...body, panel, reference: { ...body.reference, compoundVersion: reference.version } };
}

type FoundCompound = { readonly version: number; readonly groupLabels: ReadonlySet<string> };

async function findCompound(
  transaction: LaboratoryTransaction,
  { compoundId, compoundVersion }: { readonly compoundId: string; readonly compoundVersion?: number | undefined },
  path: readonly PropertyKey[],
  faults: ProblemFault[],
): Promise<FoundCompound | undefined> {
  const version = compoundVersion === undefined ? {} : { version: compoundVersion };
  const document = await findDocument(transaction, { kind: 'compound', id: compoundId, ...version });
  if (document === undefined) {
    const which = compoundVersion === undefined ? '' : ` in version ${compoundVersion}`;
    faults.push({
      pointer: jsonPointer(['body', ...path, 'compoundId']),
      detail: `there is no compound "${compoundId}"${which}`,
    });
    return undefined;
  }
  // Stored bodies passed this schema when they were created.
  const compound = JSON.parse(document.bodyText) as CompoundBody;
  const labels = compound.spinSystems.flatMap((system) => system.groups.map((group) => group.label));
  return { version: document.version, groupLabels: new Set(labels) };
}

function groupFaults(labels: readonly string[], compound: FoundCompound | undefined, index: number): ProblemFault[] {
  if (compound === undefined) return [];
  return labels.flatMap((label, position) =>
    compound.groupLabels.has(label)
      ? []
      : [
          {
            pointer: jsonPointer(['body', 'panel', index, 'quantifierGroups', position]),
            detail: `the compound has no group "${label}"; it has ${[...compound.groupLabels].join(', ')}`,
          },
        ],
  );
}
