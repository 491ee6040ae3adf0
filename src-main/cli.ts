import { join } from 'node:path';
import { createCore } from './handlers/handle.ts';
import { accountName } from './hosts/command-line/account-name.ts';
import { interrupted } from './hosts/command-line/command.ts';
import { runCommand } from './hosts/command-line/run-command.ts';
import { workerRunner } from './jobs/worker-runner.ts';

// npm runs scripts in the package's folder; paths are meant from where the command was typed.
const { INIT_CWD: typedIn, npm_lifecycle_event: script } = process.env;
if (typedIn !== undefined && script === 'footing') process.chdir(typedIn);

const createCommandCore = (home: string | undefined) =>
  createCore({
    host: 'command line',
    jobs: workerRunner(join(import.meta.dirname, 'worker.js')),
    installation: join(import.meta.dirname, '..', '..'),
    reviewerIfUnknown: { name: accountName(), role: 'account name on this machine' },
    ...(home === undefined ? {} : { home }),
  });
// Whoever reads the output may have read enough.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code !== 'EPIPE') throw error;
});
process.exitCode = await runCommand(process.argv.slice(2), createCommandCore, {
  out: (text) => process.stdout.write(text),
  error: (text) => process.stderr.write(text),
  isTerminal: process.stderr.isTTY && process.stdin.isTTY,
  environment: process.env,
  interruption: new Promise((resolve) => process.once('SIGINT', () => resolve())),
});
// Whatever the command still waited for, standard input say, nobody waits for any more.
if (process.exitCode === interrupted) process.exit();
