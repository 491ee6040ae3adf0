import { existsSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { createRequire } from 'node:module';

/**
 * The Electron program of this installation; null when only its package is there. The package itself is never loaded:
 * it would try to download what is missing.
 */
export function electronRuntime(): string | null {
  try {
    const folder = dirname(createRequire(import.meta.url).resolve('electron/package.json'));
    // Written last when the runtime is unpacked, so a fetch that was cut short is not taken for one.
    const program = join(folder, 'dist', readFileSync(join(folder, 'path.txt'), 'utf8'));
    return existsSync(program) ? program : null;
  } catch {
    return null;
  }
}
