import { closeSync, openSync, readSync } from 'node:fs';
import { ProjectError } from '../errors.ts';
import { applicationId, schemaVersion } from './file-schema.ts';

const magic = 'SQLite format 3\0';

/**
 * Reads the first 100 bytes of a file and refuses it unless they are those of a project file of this version:
 * before SQLite has touched a file that may come from anywhere.
 *
 * @throws ProjectError not-found, not-a-project, newer-version, unknown-version, other-application
 * Source  The SQLite database file format, §1.3 "The Database Header", sqlite.org/fileformat2.html
 */
export function checkHeader(path: string): void {
  const header = readStart(path, 100);
  const refuse = (code: string, expected: string, received: string, hint?: string): never => {
    throw new ProjectError({ code, where: path, expected, received, ...(hint && { hint }) });
  };
  if (header.length < 100 || header.toString('latin1', 0, 16) !== magic) {
    refuse('not-a-project', 'a Footing project', header.length === 0 ? 'an empty file' : 'a file of another kind');
  }
  const [foundApplicationId, version] = [header.readUInt32BE(68), header.readUInt32BE(60)];
  if (foundApplicationId !== applicationId) {
    const found = `a database whose application id is 0x${foundApplicationId.toString(16)}`;
    refuse('other-application', 'a Footing project', found, 'It was made by another program.');
  }
  if (version > schemaVersion) {
    const hint = 'It was written by a newer Footing. Open it with that one; this one would not see what is new in it.';
    refuse('newer-version', `a project file of version ${schemaVersion}`, `version ${version}`, hint);
  }
  if (version < schemaVersion) {
    const hint = 'No Footing ever wrote this version.';
    refuse('unknown-version', `a project file of version ${schemaVersion}`, `version ${version}`, hint);
  }
  if (header[18] !== 1 || header[19] !== 1) {
    refuse(
      'other-application',
      'a project file with a rollback journal',
      'one that another program switched to another journal',
    );
  }
}

function readStart(path: string, nBytes: number): Buffer {
  const buffer = Buffer.alloc(nBytes);
  try {
    const file = openSync(path, 'r');
    try {
      return buffer.subarray(0, readSync(file, buffer, 0, nBytes, 0));
    } finally {
      closeSync(file);
    }
  } catch (error) {
    throw new ProjectError({
      code: 'not-found',
      where: path,
      expected: 'a project file that can be read',
      received: notFoundWords(error),
      hint: 'Check the path.',
    });
  }
}

function notFoundWords(error: unknown): string {
  const code = error instanceof Error && 'code' in error ? error.code : '';
  if (code === 'ENOENT' || code === 'ENOTDIR') return 'no such file';
  if (code === 'EISDIR') return 'a folder';
  return error instanceof Error ? error.message : String(error);
}
