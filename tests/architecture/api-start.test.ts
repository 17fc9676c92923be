// The API computes nothing: what its program loads, followed from import to import through every room, holds no numeric room.
import { existsSync } from 'node:fs';
import { dirname, join, normalize } from 'node:path';
import { expect, test } from 'vitest';
import { numericRooms } from './import-table.ts';
import { exportsOf, manifestOf } from './judge-import.ts';
import { readSourceModules, rootFolder, type SourceModule } from './source-modules.ts';

const modules = new Map(readSourceModules().map((module) => [module.path, module]));

test('loads no numeric room when the API starts', () => {
  const loaded = loadedFrom('services/api/src/main.ts');
  const rooms = new Set([...loaded].map((path) => path.split('/')[1]));
  // It has been followed: these are rooms that the program cannot do without.
  expect([...rooms]).toEqual(expect.arrayContaining(['api', 'contract', 'store', 'job-queue', 'service-runtime']));
  expect(numericRooms.filter((room) => room !== 'units' && rooms.has(room))).toEqual([]);
});

test('finds the numeric rooms where they are loaded: behind the door of the inference', () => {
  const rooms = new Set([...loadedFrom('packages/spectrum-inference/src/index.ts')].map((path) => path.split('/')[1]));
  expect([...rooms]).toEqual(expect.arrayContaining(['spectrum-inference', 'numerics']));
});

function loadedFrom(entry: string): ReadonlySet<string> {
  const loaded = new Set<string>();
  const waiting = [entry];
  for (let path = waiting.pop(); path !== undefined; path = waiting.pop()) {
    if (loaded.has(path)) continue;
    loaded.add(path);
    waiting.push(...targetsOf(moduleAt(path)));
  }
  return loaded;
}

function moduleAt(path: string): SourceModule {
  const module = modules.get(path);
  if (module === undefined) throw new Error(`nothing was read at ${path}`);
  return module;
}

/** Files of this house that a module loads; type-only imports load nothing. */
function targetsOf({ path, imports }: SourceModule): string[] {
  return imports.flatMap(({ specifier, isTypeOnly }) => {
    if (isTypeOnly) return [];
    if (specifier.startsWith('.')) return [normalize(join(dirname(path), specifier))];
    if (!specifier.startsWith('@spinassay/')) return [];
    const [, name = '', ...entry] = specifier.split('/');
    const source = exportsOf(name)[entry.length === 0 ? '.' : `./${entry.join('/')}`]?.['spinassay-source'] ?? '';
    const target = normalize(join(manifestOf(name)?.folder ?? '', source));
    if (!existsSync(join(rootFolder, target))) throw new Error(`${specifier} in ${path} leads nowhere`);
    return [target];
  });
}
