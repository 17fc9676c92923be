import { createHash } from 'node:crypto';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { madeUpRequest, madeUpThread } from '../../test-support/made-up-request.ts';
import { AnalysisThrew, ThreadEnded } from './analysis-thread.ts';
import { type AnalysisThreads, createAnalysisThreads } from './analysis-threads.ts';

let threads: AnalysisThreads;
beforeEach(() => {
  threads = createAnalysisThreads({ entry: madeUpThread, readyCount: 1 });
});
afterEach(() => threads.close());

const unheard = () => ({ signal: new AbortController().signal, onProgress: () => {} });

test('gives back canonical JSON with its digest, the same from every thread', async () => {
  const outcomes = await Promise.all([1, 2, 3].map(() => threads.analyse(madeUpRequest('answer'), unheard())));
  expect(new Set(outcomes.map(({ resultText }) => resultText)).size).toBe(1);
  for (const { resultText, resultSha256, recommendation } of outcomes) {
    expect(JSON.parse(resultText)).toMatchObject({ schema: 'spinassay-result/1', seed: '1' });
    // SHA-256 of Node's own library, over the bytes that would be stored.
    expect(resultSha256).toBe(createHash('sha256').update(resultText).digest('hex'));
    expect(recommendation).toBe('held');
  }
});

test('stops an analysis at its next look, tells how far it was, and uses the thread again', async () => {
  const stopping = new AbortController();
  const heard: unknown[] = [];
  const onProgress = (...news: unknown[]) => {
    heard.push(news);
    stopping.abort(new Error('enough'));
  };
  const hooks = { signal: stopping.signal, onProgress };
  await expect(threads.analyse(madeUpRequest('work until told to stop'), hooks)).rejects.toThrow('enough');
  expect(heard).toEqual([['made-up-stage', 0.25]]);
  expect((await threads.analyse(madeUpRequest('answer'), unheard())).recommendation).toBe('held');
});

test('ends a thread that does not answer a stop, and goes on with another', async () => {
  const stopping = new AbortController();
  const hooks = { ...unheard(), signal: stopping.signal };
  const analysis = threads.analyse(madeUpRequest('work and never listen'), hooks);
  stopping.abort(new Error('enough'));
  await expect(analysis).rejects.toThrow('enough');
  expect((await threads.analyse(madeUpRequest('answer'), unheard())).recommendation).toBe('held');
});

test('begins nothing that is stopped already', async () => {
  const hooks = { ...unheard(), signal: AbortSignal.abort(new Error('enough')) };
  await expect(threads.analyse(madeUpRequest('work and never listen'), hooks)).rejects.toThrow('enough');
});

test('carries what the analysis threw over the border, with the record of a failure that a client may see', async () => {
  const refused = await threads.analyse(madeUpRequest('refuse the inputs'), unheard()).catch((error) => error);
  expect(refused).toBeInstanceOf(AnalysisThrew);
  expect(refused.failure.record).toEqual({ slug: 'analysis-not-possible', detail: 'Declare the carrier.' });
  const failed = await threads.analyse(madeUpRequest('fail'), unheard()).catch((error) => error);
  expect(failed.failure).toMatchObject({ name: 'TypeError', message: 'inner detail' });
  expect(failed.failure).not.toHaveProperty('record');
});

test('refuses a result outside the contract', async () => {
  const analysis = threads.analyse(madeUpRequest('break the contract'), unheard());
  await expect(analysis).rejects.toThrow('hostName');
});

test('tells of a thread that ended under its analysis, and goes on with another', async () => {
  await expect(threads.analyse(madeUpRequest('end the thread'), unheard())).rejects.toBeInstanceOf(ThreadEnded);
  expect((await threads.analyse(madeUpRequest('answer'), unheard())).recommendation).toBe('held');
});

test('tells at once that its threads cannot load their program, and why', async () => {
  const broken = createAnalysisThreads({ entry: new URL('./no-such-program.js', import.meta.url), readyCount: 1 });
  const error = await broken.ready().catch((reason) => reason);
  expect(error).toBeInstanceOf(ThreadEnded);
  expect(String(error.cause)).toContain('no-such-program.js');
  await expect(threads.ready()).resolves.toBeUndefined();
});
