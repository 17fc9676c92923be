import { nearestText } from './nearest-text.ts';
import type { Configuration, ConfigurationShape, Setting } from './setting.ts';

/** Everything wrong with the configuration at once; the process does not start. */
export class ConfigurationError extends Error {
  override readonly name = 'ConfigurationError';
  readonly faults: readonly string[];

  constructor(faults: readonly string[]) {
    super(
      `the configuration has ${faults.length} ${faults.length === 1 ? 'fault' : 'faults'}:\n- ${faults.join('\n- ')}`,
    );
    this.faults = faults;
  }
}

/** Variables with our prefix that belong to the launcher, the tests or another service, and are no mistake in this one. */
export const knownKeys = [
  'SPINASSAY_HOME',
  'SPINASSAY_POSTGRES',
  'SPINASSAY_REFERENCE_DATA',
  'SPINASSAY_REFERENCE_DATA_REQUIRED',
  'SPINASSAY_LOG_LEVEL',
  'SPINASSAY_FIT_CONCURRENCY',
  'SPINASSAY_BASE_URL',
  'SPINASSAY_HOST',
] as const;

const ownPrefix = 'SPINASSAY_';

/**
 * Read the configuration of a service from its environment, once, into a frozen object.
 *
 * @param otherKnownKeys variables with our prefix, beyond `knownKeys`, that are set for somebody else
 * @throws ConfigurationError with every fault: missing, not as expected, and unknown `SPINASSAY_` variables with the nearest known one
 */
export function parseConfiguration<Shape extends ConfigurationShape>(
  shape: Shape,
  environment: Readonly<Record<string, string | undefined>>,
  otherKnownKeys: readonly string[] = [],
): Configuration<Shape> {
  const faults: string[] = [];
  const entries = Object.entries(shape).map(([name, setting]) => [
    name,
    read(setting, environment[setting.key], faults),
  ]);
  const known = [...Object.values(shape).map(({ key }) => key), ...knownKeys, ...otherKnownKeys];
  faults.push(...unknownKeys(environment, known));
  if (faults.length > 0) throw new ConfigurationError(faults);
  // Each entry was read by the setting of the same name, which is what the type says.
  return Object.freeze(Object.fromEntries(entries)) as Configuration<Shape>;
}

function read<T>(setting: Setting<T>, text: string | undefined, faults: string[]): T | undefined {
  if (text === undefined || text === '') {
    if (setting.isRequired) faults.push(`${setting.key} is not set: expected ${setting.expected}`);
    return setting.default;
  }
  const value = setting.read(text);
  if (value === undefined) {
    const got = setting.isSecret ? 'something else' : JSON.stringify(text);
    faults.push(`${setting.key}: expected ${setting.expected}, got ${got}`);
  }
  return value;
}

function unknownKeys(environment: Readonly<Record<string, string | undefined>>, known: readonly string[]): string[] {
  return Object.keys(environment)
    .filter((key) => key.startsWith(ownPrefix) && !known.includes(key))
    .sort()
    .map((key) => {
      const nearest = nearestText(key, known);
      return `${key} is not known${nearest === undefined ? '' : `: did you mean ${nearest}?`}`;
    });
}
