import { existsSync, readFileSync } from 'node:fs';
import { dirname, join, normalize } from 'node:path';
import { type ImportRule, importTable } from './import-table.ts';
import { type ModuleImport, rootFolder, type SourceModule } from './source-modules.ts';

/** undefined when the house allows it, else what is wrong, in words. */
export function judgeImport(module: SourceModule, found: ModuleImport): string | undefined {
  const rule = importTable[module.room];
  if (rule === undefined) return `the room ${module.room} is not in the import table`;
  const { specifier } = found;
  if (specifier.startsWith('.')) return judgeRelative(module, specifier);
  if (specifier.startsWith('node:')) {
    return rule.node || module.kind === 'test' ? undefined : `${module.room} must not import ${specifier}`;
  }
  if (specifier.startsWith('@spinassay/')) return judgeRoom(module, found, rule);
  const name = packageOf(specifier);
  if (rule.outside.includes(name) || (module.kind === 'test' && isForTests(rule, name))) return undefined;
  return `${module.room} must not import the package ${specifier}`;
}

/** `ajv` of `ajv/dist/2020.js`; `@spinassay/store` of `@spinassay/store/test-support`. */
export function packageOf(specifier: string): string {
  return specifier.split('/', specifier.startsWith('@') ? 2 : 1).join('/');
}

/** Within its own room; what runs in production within its `src`. Tests may also use the launcher's parts and what tests share. */
function judgeRelative(module: SourceModule, specifier: string): string | undefined {
  const target = normalize(join(dirname(module.path), specifier));
  const room = module.path.split('/').slice(0, 2).join('/');
  const allowed = module.kind === 'source' ? [`${room}/src/`] : [`${room}/`, 'tests/', 'deploy/'];
  return allowed.some((folder) => target.startsWith(folder)) ? undefined : `${specifier} leaves the room`;
}

function judgeRoom(module: SourceModule, found: ModuleImport, rule: ImportRule): string | undefined {
  const [, name = '', ...entry] = found.specifier.split('/');
  const subpath = entry.length === 0 ? '.' : `./${entry.join('/')}`;
  if (!(subpath in exportsOf(name))) return `${found.specifier} is no entry that ${name} exports`;
  if (module.kind === 'test') return isAllowedInTest(module, found, rule) ? undefined : notAllowed(module, found);
  if (subpath === './test-support') return `${found.specifier} is for tests`;
  const allowed = found.isTypeOnly ? [...rule.house, ...(rule.houseTypes ?? [])] : rule.house;
  return allowed.includes(name) ? undefined : notAllowed(module, found);
}

function isAllowedInTest(module: SourceModule, { specifier }: ModuleImport, rule: ImportRule): boolean {
  const name = specifier.split('/')[1] ?? '';
  const house = [...rule.house, ...(rule.houseTypes ?? []), module.room];
  return house.includes(name) || specifier.endsWith('/test-support') || isForTests(rule, specifier);
}

function isForTests(rule: ImportRule, specifier: string): boolean {
  return packageOf(specifier) === 'vitest' || (rule.tests ?? []).includes(specifier);
}

function notAllowed(module: SourceModule, { specifier, isTypeOnly }: ModuleImport): string {
  return `${module.room} must not import ${isTypeOnly ? 'types' : 'values'} of ${specifier}`;
}

/** The doors of a room, as its package.json has them; none for a room that does not exist. */
export function exportsOf(name: string): Record<string, Record<string, string>> {
  return (manifestOf(name)?.exports ?? {}) as Record<string, Record<string, string>>;
}

export type Manifest = { exports?: object; dependencies?: object; devDependencies?: object };

/** A room's package.json, or undefined when there is no such room. */
export function manifestOf(name: string): (Manifest & { folder: string }) | undefined {
  const folder = ['packages', 'services']
    .map((parent) => `${parent}/${name}`)
    .find((path) => existsSync(join(rootFolder, path, 'package.json')));
  if (folder === undefined) return undefined;
  return { folder, ...(JSON.parse(readFileSync(join(rootFolder, folder, 'package.json'), 'utf8')) as Manifest) };
}
