import { existsSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { displayProblem } from '../display-problem.ts';

export type UsableElectron = { isUsable: true; program: string } | { isUsable: false; problem: string };

/** The Electron program of this installation, or why no window can be opened with it. */
export function usableElectron(): UsableElectron {
  const program = installedRuntime();
  if (program === null) return { isUsable: false, problem: 'its runtime is not installed' };
  const problem = displayProblem() ?? rootProblem();
  return problem === null ? { isUsable: true, program } : { isUsable: false, problem };
}

/** The package itself is never loaded: it would try to download what is missing. */
function installedRuntime(): string | null {
  try {
    const folder = dirname(createRequire(import.meta.url).resolve('electron/package.json'));
    // Written last when the runtime is unpacked, so a fetch that was cut short is not taken for one.
    const program = join(folder, 'dist', readFileSync(join(folder, 'path.txt'), 'utf8'));
    return existsSync(program) ? program : null;
  } catch {
    return null;
  }
}

/** Chromium runs as root only without its sandbox, and Footing does not run without it. */
function rootProblem(): string | null {
  return process.platform === 'linux' && process.getuid?.() === 0 ? 'it must not run as root' : null;
}
