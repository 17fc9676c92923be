import { expect, test } from 'vitest';
import { createLogger } from './index.ts';

function logged(write: (logger: ReturnType<typeof createLogger>) => void): Record<string, unknown>[] {
  const lines: string[] = [];
  write(createLogger({ service: 'test', destination: { write: (line) => void lines.push(line) } }));
  return lines.map((line) => JSON.parse(line));
}

test('writes one JSON line an event: fields, then a name', () => {
  const [line] = logged((logger) => logger.info({ fitId: 'f1', durationSeconds: 1.5 }, 'fit-recorded'));
  expect(line).toMatchObject({
    level: 'info',
    service: 'test',
    event: 'fit-recorded',
    fitId: 'f1',
    durationSeconds: 1.5,
  });
  expect(new Date(String(line?.['at'])).toISOString()).toBe(line?.['at']);
});

test('rubs access keys and passwords out, wherever they stand', () => {
  const token = `sa_abcdefghijkl_${'S3cr3t-_'.repeat(5)}xyz`;
  const error = new Error('cannot reach postgresql://user:hunter2@db/name');
  const lines = logged((logger) => {
    logger.info({ headers: { authorization: `Bearer ${token}` }, note: `key ${token} used` }, 'asked');
    logger.error({ err: error, password: 'hun\\"ter2' }, 'failed');
  });
  const text = JSON.stringify(lines);
  expect(text).not.toContain('S3cr3t');
  expect(text).not.toContain('hunter2');
  expect(text).not.toContain('ter2');
  expect(text).toContain('sa_abcdefghijkl_[removed]');
  expect(text).toContain('postgresql://user:[removed]@db/name');
});

test('leaves events below its level out', () => {
  expect(logged((logger) => logger.debug({}, 'looked'))).toEqual([]);
});
