import { parentPort } from 'node:worker_threads';
import { serveJobs } from './jobs/serve-jobs.ts';

if (!parentPort) throw new Error('worker.js runs inside a worker thread only.');
serveJobs(parentPort);
