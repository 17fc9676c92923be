import { mkdir, mkdtemp, rename, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { numericsId } from './numerics-id.ts';

let folder: string;
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'sa-'));
  await mkdir(join(folder, 'deep'));
  await writeFile(join(folder, 'a.js'), 'export const a = 1;');
  await writeFile(join(folder, 'deep/b.js'), 'export const b = 2;');
});
afterEach(() => rm(folder, { recursive: true }));

const idWith = (changes: object = {}) =>
  numericsId({ folders: [folder], runtime: 'node 20.0.0', architecture: 'x64', ...changes });

test('is the same for the same files and another one for any file, name, runtime or architecture', async () => {
  const ids = [idWith(), idWith({ runtime: 'node 22.0.0' }), idWith({ architecture: 'arm64' })];
  expect(idWith()).toBe(ids[0]);
  await writeFile(join(folder, 'deep/b.js'), 'export const b = 3;');
  ids.push(idWith());
  await rename(join(folder, 'a.js'), join(folder, 'c.js'));
  ids.push(idWith());
  expect(new Set(ids).size).toBe(5);
});

test('looks at programs only: maps and declarations change no result', async () => {
  const before = idWith();
  await writeFile(join(folder, 'a.js.map'), '{}');
  await writeFile(join(folder, 'a.d.ts'), 'export {};');
  expect(idWith()).toBe(before);
});
