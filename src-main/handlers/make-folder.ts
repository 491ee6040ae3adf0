import { resolve } from 'node:path';
import { makeFolders } from '../project/make-folders.ts';
import { fileProblem } from './file-problem.ts';

/**
 * The folder's full path; it is there afterwards, with all above it.
 *
 * @throws InputError folder-not-made
 */
export function makeFolder(path: string): string {
  const folder = resolve(path);
  try {
    makeFolders(folder);
  } catch (error) {
    throw fileProblem('folder-not-made', folder, 'a folder that is there or can be made', error);
  }
  return folder;
}
