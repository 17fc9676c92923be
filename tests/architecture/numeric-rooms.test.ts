// The numeric rooms run the same in a test, a thread and a browser, and give the same bits under every engine (style guide, section 1;
// the bits of `Math.pow` and `**` differ between releases of the runtime: measured).
import ts from 'typescript';
import { expect, test } from 'vitest';
import { numericRooms } from './import-table.ts';
import { readSourceModules, visitNodes } from './source-modules.ts';

const forbiddenGlobals = new Set([
  'Date',
  'performance',
  'process',
  'console',
  'globalThis',
  'setTimeout',
  'setInterval',
  'setImmediate',
  'queueMicrotask',
  'fetch',
  'crypto',
  'require',
  'Buffer',
  'WebAssembly',
  'Intl',
]);
const forbiddenMath = new Set(['pow', 'random']);

test('keeps clocks, the environment, chance and unsteady powers out of the numeric rooms', () => {
  const rooms: readonly string[] = numericRooms;
  const modules = readSourceModules().filter(({ room, kind }) => kind === 'source' && rooms.includes(room));
  expect(modules.length).toBeGreaterThan(rooms.length);
  const faults = modules.flatMap(({ tree, path }) => impuritiesOf(tree).map((fault) => `${path}: ${fault}`));
  expect(faults).toEqual([]);
});

test.each([
  ['const now = Date.now();', ['Date']],
  ['const x = Math.random();', ['Math.random']],
  ['const x = Math.pow(2, y);', ['Math.pow']],
  ['const { pow } = Math;', ['Math']],
  ["const x = Math['pow'](2, 3);", ['Math']],
  ['let x = 2 ** 3; x **= 2;', ['**', '**']],
  ['const t = performance.now() + globalThis.performance.now();', ['performance', 'globalThis']],
  ['// Date, process\nconst text = "Date ** process"; const o = { Date: 1 }; o.Date; Math.sqrt(2);', []],
])('tells what is impure in: %s', (text, expected) => {
  expect(impuritiesOf(ts.createSourceFile('made-up.ts', text, ts.ScriptTarget.ES2023, true))).toEqual(expected);
});

function impuritiesOf(tree: ts.SourceFile): string[] {
  const found: string[] = [];
  visitNodes(tree, (node) => {
    const impurity = ts.isIdentifier(node) ? impureName(node) : impurePower(node);
    if (impurity !== undefined) found.push(impurity);
  });
  return found;
}

function impurePower(node: ts.Node): string | undefined {
  const isPower =
    node.kind === ts.SyntaxKind.AsteriskAsteriskToken || node.kind === ts.SyntaxKind.AsteriskAsteriskEqualsToken;
  return isPower ? '**' : undefined;
}

function impureName(node: ts.Identifier): string | undefined {
  if (isMemberName(node)) return undefined;
  if (node.text !== 'Math') return forbiddenGlobals.has(node.text) ? node.text : undefined;
  // Math other than as `Math.name` could hide which function is taken.
  const { parent } = node;
  if (!ts.isPropertyAccessExpression(parent)) return 'Math';
  return forbiddenMath.has(parent.name.text) ? `Math.${parent.name.text}` : undefined;
}

/** `o.Date`, `{ Date: 1 }` and the like name a member, not the global. */
function isMemberName(node: ts.Identifier): boolean {
  const { parent } = node;
  if (ts.isPropertyAccessExpression(parent)) return parent.name === node;
  if (ts.isQualifiedName(parent)) return parent.right === node;
  return (
    (ts.isPropertyAssignment(parent) || ts.isPropertySignature(parent) || ts.isMethodDeclaration(parent)) &&
    parent.name === node
  );
}
