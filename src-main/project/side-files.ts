import { closeSync, existsSync, fstatSync, openSync, readSync } from 'node:fs';
import { ProjectError } from '../errors.ts';

/**
 * Refuses files beside a project that SQLite would act on though Footing never writes them: a write-ahead log, and a
 * rollback journal that names a further file. SQLite reads and may delete that further file, wherever it is, so a
 * journal that comes along with a project from outside must not be allowed to name one. An ordinary journal, left
 * by a process that was killed, is what brings the project back to its last command, and passes.
 *
 * @throws ProjectError foreign-journal
 * Source  The SQLite database file format, §3 "The Rollback Journal"; the ending of a journal with a super-journal
 *         name (length, checksum, the eight bytes of the journal header) is that of readSuperJournal in pager.c
 */
export function checkSideFiles(path: string): void {
  const refuse = (sideFile: string): never => {
    throw new ProjectError({
      code: 'foreign-journal',
      where: sideFile,
      expected: 'no file here, or the rollback journal that a stopped Footing leaves',
      received: 'a journal of another kind',
      hint: 'Footing does not write such a file. Move it away if you know what it is, and open the project again.',
    });
  };
  if (existsSync(`${path}-wal`)) refuse(`${path}-wal`);
  if (namesAnotherFile(`${path}-journal`)) refuse(`${path}-journal`);
}

const journalMagic = Buffer.from('d9d505f920a163d7', 'hex');

function namesAnotherFile(journalPath: string): boolean {
  const ending = readEnding(journalPath, 16);
  return ending.length === 16 && ending.subarray(8).equals(journalMagic) && ending.readUInt32BE(0) > 0;
}

/** The last bytes of a file; nothing when there is no such file, or no longer: a writer's own journal comes and goes. */
function readEnding(path: string, nBytes: number): Buffer {
  let file: number;
  try {
    file = openSync(path, 'r');
  } catch {
    return Buffer.alloc(0);
  }
  try {
    const ending = Buffer.alloc(nBytes);
    const { size } = fstatSync(file);
    return ending.subarray(0, readSync(file, ending, 0, nBytes, Math.max(0, size - nBytes)));
  } finally {
    closeSync(file);
  }
}
