import { join, resolve } from 'node:path';

/** Unlikely to be taken: no registered service has it (IANA's list of port numbers, from memory). */
const portDefault = 8480;

/**
 * What the launcher was asked to do.
 *
 * @returns {{root: string, home: string, port: number, host: string, publicUrl?: string, databaseUrl?: string, engine?: string, isDemoWanted: boolean}}
 * @throws Error naming everything that is wrong, before anything is started
 */
export function readLaunchOptions({ words, environment, root }) {
  const faults = [];
  for (const word of words) {
    if (word !== '--without-demo') faults.push(`"${word}" is not known; there is --without-demo`);
  }
  const port = Number(environment.PORT || portDefault);
  if (!/^\d*$/.test(environment.PORT ?? '') || port > 65_535) {
    faults.push(`PORT: expected a whole number from 0 to 65535, got "${environment.PORT}"`);
  }
  if (faults.length > 0) throw new Error(faults.join('\n'));
  return {
    root,
    home: environment.SPINASSAY_HOME ? resolve(environment.SPINASSAY_HOME) : join(root, '.spinassay'),
    port,
    host: environment.SPINASSAY_HOST || '127.0.0.1',
    publicUrl: environment.SPINASSAY_BASE_URL || undefined,
    databaseUrl: environment.DATABASE_URL || undefined,
    engine: environment.SPINASSAY_POSTGRES || undefined,
    isDemoWanted: !words.includes('--without-demo'),
  };
}
