import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import ts from 'typescript';

export type ModuleImport = {
  readonly specifier: string;
  /** True when nothing of it is left after the types are rubbed out. */
  readonly isTypeOnly: boolean;
};

export type SourceModule = {
  /** Name of the room, such as `store`. */
  readonly room: string;
  /** Relative to the root, such as `packages/store/src/index.ts`. */
  readonly path: string;
  /** `source` runs in production; `test` is a test, its support or a benchmark. */
  readonly kind: 'source' | 'test';
  readonly tree: ts.SourceFile;
  readonly imports: readonly ModuleImport[];
};

export const rootFolder = fileURLToPath(new URL('../..', import.meta.url));

/** Every module of every room, parsed by the compiler: what a pattern finds in text, a comment or a string could hide or fake. */
export function readSourceModules(): SourceModule[] {
  return ['packages', 'services'].flatMap((parent) =>
    readdirSync(join(rootFolder, parent)).flatMap((room) =>
      ['src', 'test-support', 'bench'].flatMap((folder) => modulesIn(room, `${parent}/${room}/${folder}`)),
    ),
  );
}

function modulesIn(room: string, folder: string): SourceModule[] {
  if (!existsSync(join(rootFolder, folder))) return [];
  return readdirSync(join(rootFolder, folder), { recursive: true, encoding: 'utf8' })
    .filter((name) => /\.m?ts$|\.mjs$/.test(name))
    .map((name) => parse(room, `${folder}/${name}`));
}

function parse(room: string, path: string): SourceModule {
  const text = readFileSync(join(rootFolder, path), 'utf8');
  const tree = ts.createSourceFile(path, text, ts.ScriptTarget.ES2023, true);
  const isTest = /\.test\.ts$/.test(path) || !path.includes('/src/');
  return { room, path, kind: isTest ? 'test' : 'source', tree, imports: importsOf(tree) };
}

function importsOf(tree: ts.SourceFile): ModuleImport[] {
  const found: ModuleImport[] = [];
  visitNodes(tree, (node) => {
    const seen = importOf(node);
    if (seen !== undefined) found.push(seen);
  });
  return found;
}

/** Static imports, re-exports, `import()` of values and of types. */
function importOf(node: ts.Node): ModuleImport | undefined {
  if (ts.isImportDeclaration(node)) {
    return literal(node.moduleSpecifier, node.importClause?.phaseModifier === ts.SyntaxKind.TypeKeyword);
  }
  if (ts.isExportDeclaration(node) && node.moduleSpecifier !== undefined) {
    return literal(node.moduleSpecifier, node.isTypeOnly);
  }
  if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) return literal(node.argument.literal, true);
  if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
    return literal(node.arguments[0], false);
  }
  return undefined;
}

function literal(node: ts.Node | undefined, isTypeOnly: boolean): ModuleImport {
  // An import whose target is computed cannot be judged: it is given back under a name that no table holds.
  return { specifier: node !== undefined && ts.isStringLiteralLike(node) ? node.text : '(computed)', isTypeOnly };
}

/** Call back for every node of a tree, parents before children. */
export function visitNodes(node: ts.Node, onNode: (node: ts.Node) => void): void {
  onNode(node);
  ts.forEachChild(node, (child) => visitNodes(child, onNode));
}
