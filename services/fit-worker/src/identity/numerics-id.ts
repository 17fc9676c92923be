import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Whose code decides the bytes of a result: the numeric rooms, the transform they use, and the contract's defaults and canonical form. */
const packages = [
  '@spinassay/contract',
  '@spinassay/numerics',
  '@spinassay/signal-processing',
  '@spinassay/spectrum-inference',
  '@spinassay/spin-dynamics',
  '@spinassay/units',
];

/** What a digest is made over; only tests give other values. */
export type NumericsParts = {
  readonly folders: readonly string[];
  readonly runtime: string;
  readonly architecture: string;
};

/**
 * Name what computed a result: SHA-256 over the built files that decide its bytes, the runtime and the architecture.
 * The same inputs, seed and id give the same bytes; another id promises agreement within the uncertainties only.
 */
export function numericsId(parts: NumericsParts = currentParts()): string {
  const hash = createHash('sha256').update(`${parts.runtime}\n${parts.architecture}\n`);
  for (const folder of parts.folders) {
    const names = readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.js'));
    for (const name of names.sort()) {
      const bytes = readFileSync(join(folder, name));
      // Lengths keep the border between two files from moving unseen.
      hash.update(`${name}\n${bytes.length}\n`).update(bytes);
    }
  }
  return hash.digest('hex');
}

function currentParts(): NumericsParts {
  const { resolve } = createRequire(import.meta.url);
  const rooms = packages.map((name) => dirname(resolve(name)));
  const transform = join(dirname(createRequire(resolve('@spinassay/numerics')).resolve('fft.js/package.json')), 'lib');
  const analysis = fileURLToPath(new URL('../analysis/', import.meta.url));
  return {
    folders: [...rooms, transform, analysis],
    runtime: `node ${process.versions.node} v8 ${process.versions.v8}`,
    architecture: process.arch,
  };
}
