import { existsSync } from 'node:fs';
import { join, resolve } from 'node:path';

/** A file name after the title that is not taken yet. */
export function freePath(directory: string, title: string): string {
  const stem =
    title
      .normalize('NFKD')
      .toLowerCase()
      .replace(/[^a-z0-9]+/g, '-')
      .replace(/^-+|-+$/g, '')
      .slice(0, 60) || 'review';
  let path = join(resolve(directory), `${stem}.footing`);
  for (let copy = 2; existsSync(path); copy += 1) path = join(resolve(directory), `${stem}-${copy}.footing`);
  return path;
}
