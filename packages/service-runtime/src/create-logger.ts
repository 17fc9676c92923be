import { type Logger, pino } from 'pino';

export type LogLevel = 'debug' | 'info' | 'warn' | 'error';
export const logLevels: readonly LogLevel[] = ['debug', 'info', 'warn', 'error'];

export type LoggerOptions = {
  /** Name of the service. */
  readonly service: string;
  readonly level?: LogLevel;
  /** Where lines go; default standard output. */
  readonly destination?: { write(line: string): void };
};

export type { Logger };

/**
 * A log of events: `logger.info({ fitId, durationSeconds }, 'fit-recorded')` - fields first, then a past-tense name.
 *
 * Whatever line is written, access keys and passwords of addresses are rubbed out of it: the last wall, not a licence to log them.
 */
export function createLogger({ service, level = 'info', destination = process.stdout }: LoggerOptions): Logger {
  const settings = {
    level,
    base: { service },
    messageKey: 'event',
    timestamp: () => `,"at":"${new Date().toISOString()}"`,
    formatters: { level: (label: string) => ({ level: label }) },
  };
  return pino(settings, { write: (line) => void destination.write(withoutSecrets(line)) });
}

const secretPatterns: readonly [RegExp, string][] = [
  [/\bsa_([0-9a-z]{12})_[A-Za-z0-9_-]+/g, 'sa_$1_[removed]'],
  [/([a-z][a-z0-9+]*:\/\/[^\s:@/"]*:)[^\s@/"]+@/g, '$1[removed]@'],
  [/("(?:authorization|password|secret|token)":")(?:[^"\\]|\\.)*"/gi, '$1[removed]"'],
];

/** A text without the secrets of access keys, passwords in addresses, and fields that are named after a secret. */
export function withoutSecrets(text: string): string {
  return secretPatterns.reduce((cleaned, [pattern, replacement]) => cleaned.replace(pattern, replacement), text);
}
