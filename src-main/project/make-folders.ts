import { existsSync, mkdirSync, statSync } from 'node:fs';
import { dirname } from 'node:path';

/**
 * Makes a folder and what is missing above it. (mkdir's own way of doing this never ends where the system says of a
 * folder that is there that it is not, as in /proc.)
 */
export function makeFolders(folder: string, mode = 0o777): void {
  const missing: string[] = [];
  for (let path = folder; !existsSync(path) && dirname(path) !== path; path = dirname(path)) missing.unshift(path);
  for (const path of missing) mkdirSync(path, { mode });
  if (!statSync(folder).isDirectory()) throw Object.assign(new Error('a file in its place'), { code: 'EEXIST' });
}
