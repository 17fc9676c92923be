import type { FeedPage } from '../feed.ts';
import type { Fit, FitPost } from '../fit.ts';

const fitId = '0190c3a4-11aa-7d02-8e21-6d1c7f0a9b10';
const resultSha256 = 'fcde2b2edba56bf408601fb721fe9b5c338d10ee429ea04fae5511b68fbf8fb9';

export const fitPostExample: FitPost = {
  acquisitionId: '0190c3a2-7d55-7c11-9c5e-3f0d6b2f6a01',
  methodId: 'acetate-in-cider',
  preparationId: 'tank-4-night-17',
};

export const queuedFitExample: Fit = {
  id: fitId,
  status: 'queued',
  attempt: 0,
  acquisitionId: fitPostExample.acquisitionId,
  conditionsVersion: 1,
  methodId: 'acetate-in-cider',
  methodVersion: 1,
  preparationId: 'tank-4-night-17',
  preparationVersion: 1,
  options: {},
  // The first 64 bits are 0x0123456789abcdef, in decimal 81985529216486895.
  inputSha256: '0123456789abcdef0123456789abcdef0123456789abcdef0123456789abcdef',
  seed: '81985529216486895',
  createdAt: '2026-01-17T03:12:46.003Z',
};

export const fitExample: Fit = {
  ...queuedFitExample,
  status: 'completed',
  attempt: 1,
  resultSha256,
  finishedAt: '2026-01-17T03:12:51.870Z',
};

export const feedPageExample: FeedPage = {
  events: [
    {
      cursor: 'MTc',
      kind: 'result',
      fitId,
      acquisitionId: fitPostExample.acquisitionId,
      methodId: fitPostExample.methodId,
      methodVersion: 1,
      recommendation: 'held',
      resultSha256,
      committedAt: '2026-01-17T03:12:51.870Z',
    },
  ],
  nextCursor: 'MTc',
  hasMore: false,
};
