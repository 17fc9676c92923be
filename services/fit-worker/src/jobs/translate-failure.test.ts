import { BlobDamagedError, FencedError } from '@spinassay/store';
import { expect, test } from 'vitest';
import { AnalysisThrew, ThreadEnded } from '../threads/analysis-thread.ts';
import { FitStopped } from './fit-stopped.ts';
import { translateFailure } from './translate-failure.ts';

const threw = (name: string, message = 'expected one thing, got another') =>
  new AnalysisThrew({ name, message, stack: '' });

test('writes nothing for a fit that is no longer ours', () => {
  const fence = { jobId: 'j', attempt: 1, laboratoryId: 'l' };
  expect(translateFailure(new FencedError(fence))).toEqual({ act: 'leave' });
  expect(translateFailure(new FitStopped('fenced'))).toEqual({ act: 'leave' });
});

test('cancels what was cancelled, and hands back what a shutdown interrupts without holding it against the fit', () => {
  expect(translateFailure(new FitStopped('cancel-requested'))).toEqual({ act: 'cancel' });
  expect(translateFailure(new FitStopped('shutdown'))).toEqual({ act: 'hand-back', delaySeconds: 0, isForgiven: true });
});

test('hands back, later and forgiven, when the database is away', () => {
  const away = Object.assign(new Error('connect ECONNREFUSED'), { code: 'ECONNREFUSED' });
  expect(translateFailure(away)).toMatchObject({ act: 'hand-back', isForgiven: true });
});

test('fails with the record of a failure that was made for a client', () => {
  const record = { slug: 'analysis-not-possible', detail: 'Declare the carrier.' } as const;
  const error = new AnalysisThrew({ name: 'ProblemError', message: '', stack: '', record });
  expect(translateFailure(error)).toEqual({ act: 'fail', problem: record });
});

test.each(['DomainError', 'SystemTooLargeError'])('tells the client what a %s says about the inputs', (name) => {
  expect(translateFailure(threw(name))).toMatchObject({
    act: 'fail',
    problem: { slug: 'analysis-not-possible', detail: expect.stringContaining('expected one thing, got another') },
  });
});

test.each([
  threw('TypeError', 'secret inner detail'),
  threw('DimensionError', 'secret inner detail'),
  new ThreadEnded('secret inner detail'),
  new BlobDamagedError('secret', 'secret inner detail'),
  new Error('secret inner detail'),
  'secret inner detail',
])('fails by our own fault without telling the inner detail: %s', (error) => {
  const decision = translateFailure(error);
  expect(decision).toMatchObject({ act: 'fail', problem: { slug: 'analysis-failed' } });
  expect(JSON.stringify(decision)).not.toContain('secret');
});
