import { EventEmitter } from 'node:events';
import { expect, test } from 'vitest';
import { superviseShutdown } from './index.ts';

/** A process that only has events and a parent. */
class MadeUpProcess extends EventEmitter {
  ppid = 100;
}

function supervise(drain: () => Promise<void>) {
  const supervised = new MadeUpProcess();
  const exitCodes: number[] = [];
  const reasons: string[] = [];
  let onLeft: (exitCode: number) => void = () => {};
  const left = new Promise<number>((resolve) => {
    onLeft = resolve;
  });
  const supervision = superviseShutdown({
    logger: { info: () => {}, error: () => {} },
    drain: (reason) => {
      reasons.push(reason);
      return drain();
    },
    leave: (exitCode) => {
      exitCodes.push(exitCode);
      onLeft(exitCode);
    },
    supervised,
    parentLookMilliseconds: 1,
  });
  return { supervised, exitCodes, reasons, left, supervision };
}

test('drains once at the first signal and leaves with 0', async () => {
  const { supervised, reasons, left, supervision } = supervise(async () => {});
  supervised.emit('SIGTERM');
  supervised.emit('disconnect');
  expect(await left).toBe(0);
  expect(reasons).toEqual(['SIGTERM']);
  supervision.stop();
});

test('leaves with 1 at once when a second signal meets a drain that does not end', () => {
  const { supervised, exitCodes, supervision } = supervise(() => new Promise(() => {}));
  supervised.emit('SIGINT');
  expect(exitCodes).toEqual([]);
  supervised.emit('SIGINT');
  expect(exitCodes).toEqual([1]);
  supervision.stop();
});

test('leaves with 1 when the drain fails', async () => {
  const { supervised, left, supervision } = supervise(() => Promise.reject(new Error('stuck')));
  supervised.emit('SIGTERM');
  expect(await left).toBe(1);
  supervision.stop();
});

test('drains when the launcher disconnects', async () => {
  const { supervised, reasons, left, supervision } = supervise(async () => {});
  supervised.emit('disconnect');
  expect(await left).toBe(0);
  expect(reasons).toEqual(['launcher-disconnected']);
  supervision.stop();
});

test('drains when the parent is gone', async () => {
  const { supervised, reasons, left, supervision } = supervise(async () => {});
  supervised.ppid = 1;
  expect(await left).toBe(0);
  expect(reasons).toEqual(['parent-changed']);
  supervision.stop();
});

test('hears nothing once it was stopped', () => {
  const { supervised, supervision } = supervise(async () => {});
  supervision.stop();
  expect(supervised.eventNames()).toEqual([]);
});
