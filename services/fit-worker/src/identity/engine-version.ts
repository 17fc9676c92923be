import { readFileSync } from 'node:fs';

/** Version of the service that made a result, as its package states it. */
export function engineVersion(): string {
  // One folder above `src` and above `dist` alike.
  const manifest: unknown = JSON.parse(readFileSync(new URL('../../package.json', import.meta.url), 'utf8'));
  const version: unknown = Reflect.get(Object(manifest), 'version');
  if (typeof version !== 'string') throw new Error('the package of the fit-worker states no version');
  return version;
}
