import { expect, test } from 'vitest';
import { digestOf, seedLaboratory, storeForTests } from '../../test-support/index.ts';
import { createDocumentVersion, type DocumentKind, findDocument, listLatestDocuments } from '../index.ts';

const there = storeForTests();

const compound = (bodyText: string, id = 'ethanol') =>
  ({ kind: 'compound', id, name: id, bodyText, sha256: digestOf(bodyText) }) as const;

test('counts versions from 1 and gives each back as it was written', async () => {
  const { laboratoryId } = await seedLaboratory(there.store, 'versions');
  const texts = ['{"a":1e-7}', '{"b":"\u00e9"}', '{"a":1e-7}'];
  await there.store.withLaboratory(laboratoryId, async (transaction) => {
    for (const [index, text] of texts.entries()) {
      const { outcome, document } = await createDocumentVersion(transaction, compound(text));
      expect([outcome, document.version]).toEqual(['created', index + 1]);
    }
    expect((await createDocumentVersion(transaction, compound('{"a":1e-7}'))).outcome).toBe('unchanged');
    for (const [index, text] of texts.entries()) {
      const address = { kind: 'compound', id: 'ethanol', version: index + 1 } as const;
      expect((await findDocument(transaction, address))?.bodyText).toBe(text);
    }
    expect((await findDocument(transaction, { kind: 'compound', id: 'ethanol' }))?.version).toBe(3);
    expect(await findDocument(transaction, { kind: 'compound', id: 'ethanol', version: 4 })).toBeUndefined();
    expect(await findDocument(transaction, { kind: 'method', id: 'ethanol' })).toBeUndefined();
  });
});

test('gives 10 writers of the same id 10 dense versions', async () => {
  const { laboratoryId } = await seedLaboratory(there.store, 'dense');
  const write = (index: number) =>
    there.store.withLaboratory(laboratoryId, (transaction) =>
      createDocumentVersion(transaction, compound(`{"n":${index}}`)),
    );
  const written = await Promise.all(Array.from({ length: 10 }, (_, index) => write(index)));
  const versions = written.map(({ document }) => document.version).sort((a, b) => a - b);
  expect(versions).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
});

test('gives 10 writers of the same body one version', async () => {
  const { laboratoryId } = await seedLaboratory(there.store, 'same body');
  const write = () =>
    there.store.withLaboratory(laboratoryId, (transaction) => createDocumentVersion(transaction, compound('{}')));
  const written = await Promise.all(Array.from({ length: 10 }, write));
  expect(written.filter(({ outcome }) => outcome === 'created')).toHaveLength(1);
});

test('lists the latest version of each, in order of id, of one kind and one laboratory', async () => {
  const { laboratoryId } = await seedLaboratory(there.store, 'lists');
  const list = (kind: DocumentKind) =>
    there.store.withLaboratory(laboratoryId, async (transaction) =>
      (await listLatestDocuments(transaction, kind)).map(({ id, version }) => `${id} ${version}`),
    );
  await there.store.withLaboratory(laboratoryId, async (transaction) => {
    for (const id of ['b-2', 'a', 'b-10', 'b']) await createDocumentVersion(transaction, compound('{}', id));
    await createDocumentVersion(transaction, compound('{"x":1}', 'b'));
  });
  expect(await list('compound')).toEqual(['a 1', 'b 2', 'b-10 1', 'b-2 1']);
  expect(await list('method')).toEqual(['made-up 1']);
  expect(await list('preparation')).toEqual([]);
});

test('refuses a body whose digest is another', async () => {
  const { laboratoryId } = await seedLaboratory(there.store, 'digests');
  const wrong = { ...compound('{}'), sha256: digestOf('{ }') };
  const writing = there.store.withLaboratory(laboratoryId, (transaction) => createDocumentVersion(transaction, wrong));
  await expect(writing).rejects.toThrow(/check constraint/);
});
