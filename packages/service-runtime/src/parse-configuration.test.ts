import { expect, expectTypeOf, test } from 'vitest';
import {
  ConfigurationError,
  choiceSetting,
  integerSetting,
  optionalTextSetting,
  parseConfiguration,
  textSetting,
} from './index.ts';

const shape = {
  port: integerSetting({ key: 'PORT', default: 8_080, min: 0, max: 65_535 }),
  databaseUrl: textSetting({ key: 'DATABASE_URL', isSecret: true }),
  level: choiceSetting({ key: 'SPINASSAY_LOG_LEVEL', choices: ['info', 'debug'], default: 'info' }),
  label: optionalTextSetting({ key: 'SPINASSAY_LABEL' }),
};

const faultsOf = (environment: Record<string, string>) => {
  try {
    parseConfiguration(shape, environment);
  } catch (error) {
    if (error instanceof ConfigurationError) return error.faults;
  }
  return [];
};

test('reads what is set, takes defaults for what is absent or empty, and freezes the outcome', () => {
  const configuration = parseConfiguration(shape, { DATABASE_URL: 'postgresql://x', PORT: '', HOME: '/root' });
  expect(configuration).toEqual({ port: 8_080, databaseUrl: 'postgresql://x', level: 'info', label: undefined });
  expect(Object.isFrozen(configuration)).toBe(true);
  expectTypeOf(configuration.port).toEqualTypeOf<number>();
  expectTypeOf(configuration.level).toEqualTypeOf<'info' | 'debug'>();
});

test('tells every fault at once, and the nearest known key for an unknown one', () => {
  expect(
    faultsOf({ PORT: '65536', SPINASSAY_LOG_LEVEL: 'loud', SPINASSAY_POSTGRESS: 'embedded', SPINASSAY_Q: '1' }),
  ).toEqual([
    'PORT: expected a whole number from 0 to 65535, got "65536"',
    'DATABASE_URL is not set: expected a text',
    'SPINASSAY_LOG_LEVEL: expected one of info, debug, got "loud"',
    'SPINASSAY_POSTGRESS is not known: did you mean SPINASSAY_POSTGRES?',
    'SPINASSAY_Q is not known: did you mean SPINASSAY_HOME?',
  ]);
});

test.each(['1e3', '12.5', '0x10', ' 7', 'Infinity', '-1'])('refuses %s as a port', (text) => {
  expect(faultsOf({ DATABASE_URL: 'x', PORT: text })).toHaveLength(1);
});

test('leaves variables of other programs alone', () => {
  expect(faultsOf({ DATABASE_URL: 'x', PATH: '/bin', SPINASSAY_REFERENCE_DATA: 'data' })).toEqual([]);
});
