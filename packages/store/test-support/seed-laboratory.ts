import { createHash } from 'node:crypto';
import {
  createAcquisition,
  createDocumentVersion,
  createFit,
  createLaboratory,
  type NewAcquisition,
  type NewFit,
  type Store,
  type StoredFit,
} from '../src/index.ts';

export type SeededLaboratory = {
  readonly laboratoryId: string;
  readonly acquisitionId: string;
  /** Ask for another fit of the same acquisition; `label` makes its natural key. */
  askForFit(label: string, changes?: Partial<NewFit>): Promise<StoredFit>;
};

/** SHA-256 of a text, as the tests need it for made-up digests. */
export const digestOf = (text: string | Uint8Array) => createHash('sha256').update(text).digest('hex');

/** A made-up signal of four samples; `label` makes its identity. */
export function madeUpAcquisition(label: string): NewAcquisition {
  const samples = Float64Array.of(1, 0, 0.5, -0.25, 0.25, 0.125, 1e-7, -1e-300);
  const effectiveText = '{"sequence":"single-pulse"}';
  return {
    signal: {
      bytes: new Uint8Array(samples.buffer),
      sha256: digestOf(`signal ${label}`),
      sampleCount: 4,
      dwellSeconds: 1 / 12_019.23,
      observeFrequencyMHz: 600.13282,
      nucleus: '1H',
    },
    original: { bytes: new TextEncoder().encode(`##TITLE=${label}\n`), mediaType: 'chemical/x-jcamp-dx' },
    title: label,
    conditions: { effectiveText, declaredText: effectiveText, fileText: '{}', sha256: digestOf(effectiveText) },
  };
}

/** A laboratory with one acquisition and one method, ready to ask for fits. The bodies are made up: the store never reads them. */
export async function seedLaboratory(store: Store, name: string): Promise<SeededLaboratory> {
  const { id: laboratoryId } = await createLaboratory(store, { name });
  const acquisitionId = await store.withLaboratory(laboratoryId, async (transaction) => {
    const bodyText = '{"panel":[]}';
    const method = { kind: 'method', id: 'made-up', name: 'Made up', bodyText, sha256: digestOf(bodyText) } as const;
    await createDocumentVersion(transaction, method);
    return (await createAcquisition(transaction, madeUpAcquisition(name))).acquisition.id;
  });
  const askForFit = (label: string, changes: Partial<NewFit> = {}) =>
    store.withLaboratory(laboratoryId, async (transaction) => {
      const order: NewFit = {
        acquisitionId,
        conditionsVersion: 1,
        methodId: 'made-up',
        methodVersion: 1,
        optionsText: '{}',
        naturalKey: digestOf(`key ${label}`),
        inputSha256: digestOf(`input ${label}`),
        seed: '18446744073709551615',
        ...changes,
      };
      return (await createFit(transaction, order)).fit;
    });
  return { laboratoryId, acquisitionId, askForFit };
}
