// The import table of the style guide, section 1, held against every module of the house.
import { expect, test } from 'vitest';
import { importTable } from './import-table.ts';
import { judgeImport, manifestOf, packageOf } from './judge-import.ts';
import { readSourceModules, type SourceModule } from './source-modules.ts';

const modules = readSourceModules();

/** A gate that looked at nothing says yes to everything. */
test('sees modules of every room of the table, and imports in them', () => {
  const rooms = new Set(modules.map(({ room }) => room));
  expect([...rooms].sort()).toEqual(Object.keys(importTable).sort());
  expect(modules.length).toBeGreaterThan(0);
  expect(modules.flatMap(({ imports }) => imports).length).toBeGreaterThan(modules.length);
});

test('lets no module import anything outside the table', () => {
  const faults = modules.flatMap((module) =>
    module.imports.flatMap((found) => {
      const fault = judgeImport(module, found);
      return fault === undefined ? [] : [`${module.path}: ${fault}`];
    }),
  );
  expect(faults).toEqual([]);
});

test('finds every package that production code imports among the dependencies of its room', () => {
  const faults = modules
    .filter(({ kind }) => kind === 'source')
    .flatMap(({ room, path, imports }) =>
      imports
        .filter(({ specifier }) => !/^(\.|node:)/.test(specifier))
        .map(({ specifier }) => packageOf(specifier))
        .filter((name) => !(name in (manifestOf(room)?.dependencies ?? {})))
        .map((name) => `${path}: ${name}`),
    );
  expect(faults).toEqual([]);
});

/** Each line is wrong, or right, by the table of the style guide; were the judge blind, this is where it would show. */
test.each([
  ['numerics', 'source', '@spinassay/units', false, 'must not import values'],
  ['spin-dynamics', 'source', 'node:fs', false, 'must not import node:fs'],
  ['spin-dynamics', 'source', 'ml-matrix', false, 'must not import the package'],
  ['spin-dynamics', 'test', 'ml-matrix', false, undefined],
  ['api', 'source', '@spinassay/numerics', false, 'must not import values'],
  ['api', 'source', '@spinassay/store/src/migrate.ts', false, 'is no entry'],
  ['api', 'source', '@spinassay/store/test-support', false, 'is for tests'],
  ['api', 'test', '@spinassay/store/test-support', false, undefined],
  ['api', 'source', '../../../packages/store/src/migrate.ts', false, 'leaves the room'],
  ['api', 'source', '(computed)', false, 'must not import the package'],
  ['acquisition-formats', 'source', '@spinassay/contract', true, undefined],
  ['acquisition-formats', 'source', '@spinassay/contract', false, 'must not import values'],
  ['signal-generator', 'source', '@spinassay/spin-dynamics', true, 'must not import types'],
  ['attic', 'source', 'zod', false, 'not in the import table'],
] as const)('judges %s (%s) importing %s', (room, kind, specifier, isTypeOnly, expected) => {
  const module = { room, kind, path: `packages/${room}/src/made-up.ts`, imports: [] } as unknown as SourceModule;
  const fault = judgeImport(module, { specifier, isTypeOnly });
  if (expected === undefined) expect(fault).toBeUndefined();
  else expect(fault).toContain(expected);
});
