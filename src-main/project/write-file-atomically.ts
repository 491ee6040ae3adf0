import { randomUUID } from 'node:crypto';
import { closeSync, fsyncSync, openSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';

/** Writes a file that only its owner may read: afterwards there is the new content or, whatever happens, the old one. */
export function writeFileAtomically(path: string, text: string): void {
  const draftPath = `${path}.${randomUUID()}.draft`;
  try {
    const draft = openSync(draftPath, 'wx', 0o600);
    try {
      writeFileSync(draft, text);
      fsyncSync(draft);
    } finally {
      closeSync(draft);
    }
    renameSync(draftPath, path);
  } catch (error) {
    rmSync(draftPath, { force: true });
    throw error;
  }
  syncFolder(dirname(path));
}

/** Makes the renaming itself last through a power cut, where the system lets a folder be opened (not on Windows). */
function syncFolder(folder: string): void {
  if (process.platform === 'win32') return;
  const handle = openSync(folder, 'r');
  try {
    fsyncSync(handle);
  } finally {
    closeSync(handle);
  }
}
