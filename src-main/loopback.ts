import { fileURLToPath } from 'node:url';
import { createCore } from './handlers/handle.ts';
import { runLoopback } from './hosts/loopback/run-loopback.ts';
import { workerRunner } from './jobs/worker-runner.ts';

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url));

process.exitCode = await runLoopback({
  createCore: () => createCore({ host: 'loopback', jobs: workerRunner(at('./worker.js')), installation: at('../..') }),
  rendererDirectory: at('../renderer'),
  args: process.argv.slice(2),
});
