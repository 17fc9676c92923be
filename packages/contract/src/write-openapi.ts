// Writes openapi.yaml at the root from the schemas, so that it can never say anything else than the code.
// With --check it writes nothing and fails when the committed file would move.
import { readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { openApiText } from './openapi/openapi-text.ts';

const path = fileURLToPath(new URL('../../../openapi.yaml', import.meta.url));
const text = openApiText();

if (!process.argv.includes('--check')) {
  writeFileSync(path, text);
  process.stdout.write(`wrote ${path}\n`);
} else if (readFileSync(path, 'utf8') !== text) {
  process.stderr.write('openapi.yaml differs from the schemas; run: node packages/contract/dist/write-openapi.js\n');
  process.exitCode = 1;
}
