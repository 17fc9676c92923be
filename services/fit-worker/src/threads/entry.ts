// The program of a thread: the numerics, away from the event loop that keeps the leases.
import { parentPort } from 'node:worker_threads';
import { analyseAcquisition } from '../analysis/analyse-acquisition.ts';
import { serveAnalyses } from './serve-analyses.ts';

if (parentPort === null) throw new Error('this program runs in a thread of the fit-worker only');
serveAnalyses(parentPort, analyseAcquisition);
