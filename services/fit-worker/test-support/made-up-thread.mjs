// A thread that does what the method's name says instead of any numerics: tests of the service use it in place of the real one.
import { parentPort } from 'node:worker_threads';
import { ProblemError } from '@spinassay/problems';
import { unanswerableResult } from '../dist/analysis/unanswerable-result.js';
import { serveAnalyses } from '../dist/threads/serve-analyses.js';

const reasons = [{ code: 'made-up', detail: 'Nothing was analysed.' }];

const acts = {
  answer: (request) => unanswerableResult(request, reasons),
  'work until told to stop': (_request, hooks) => {
    hooks.onProgress('made-up-stage', 0.25);
    while (!hooks.isCancelled());
    throw new Error('stopped');
  },
  'work and never listen': () => {
    for (;;);
  },
  'refuse the inputs': () => {
    throw new ProblemError({ slug: 'analysis-not-possible', detail: 'Declare the carrier.' });
  },
  fail: () => {
    throw new TypeError('inner detail');
  },
  'break the contract': (request) => ({ ...unanswerableResult(request, reasons), hostName: 'made up' }),
  'end the thread': () => process.exit(3),
};

serveAnalyses(parentPort, (request, hooks) => acts[request.method.name](request, hooks));
