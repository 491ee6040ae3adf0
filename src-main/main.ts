import { fileURLToPath } from 'node:url';
import { createCore } from './handlers/handle.ts';
import { startElectronShell } from './hosts/electron/electron-shell.ts';
import { workerRunner } from './jobs/worker-runner.ts';

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url));

startElectronShell({
  createCore: () => createCore({ host: 'electron', jobs: workerRunner(at('./worker.js')), installation: at('../..') }),
  rendererDirectory: at('../renderer'),
  preload: at('../preload/preload.cjs'),
});
