// Runs after every install of this package: fetches the Electron runtime once, if it can be had. Never fails an
// install, because Footing also runs in a browser.
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

const timeLimitMs = 60_000;
const installer = fileURLToPath(new URL('../node_modules/electron/install.js', import.meta.url));

// Without the development packages there is nothing to fetch for; whoever sets the variable wants no fetching.
if (existsSync(installer) && !process.env.ELECTRON_SKIP_BINARY_DOWNLOAD) {
  const { status, error, stderr } = spawnSync(process.execPath, [installer], {
    timeout: timeLimitMs,
    killSignal: 'SIGKILL',
    stdio: ['ignore', 'ignore', 'pipe'],
    encoding: 'utf8',
  });
  if (status !== 0) {
    const reason =
      error?.code === 'ETIMEDOUT' ? 'it took longer than a minute' : firstLine(stderr ?? error?.message ?? '');
    console.log(`The Electron runtime could not be fetched (${reason}); npm start will use the browser instead.`);
  }
}

/** @param {string} text */
function firstLine(text) {
  const [line = ''] = text.trim().split('\n');
  return line.slice(0, 160) || 'no reason given';
}
