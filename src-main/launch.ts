import { fileURLToPath } from 'node:url';
import { runLaunch } from './hosts/launch/run-launch.ts';

process.exitCode = await runLaunch({
  args: process.argv.slice(2),
  application: fileURLToPath(new URL('../..', import.meta.url)),
  runInBrowser: () => import('./loopback.ts'),
});
