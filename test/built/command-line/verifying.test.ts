import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { footing } from '../../helpers/command-line.ts';
import { editFile, editPastTriggers } from '../../helpers/edit-past-triggers.ts';
import { copyOf, prepareReview, project, workingFolder } from '../../helpers/review-folder.ts';

/** What somebody did to the file, and what must be named. */
const tampering: [string, (path: string) => void, string][] = [
  [
    'a flipped byte in an entry',
    (path) =>
      editPastTriggers(path, 'trail', (db) =>
        db.exec(
          `UPDATE trail SET entry = replace(entry, '"action":"add claim"', '"action":"add cmaim"') WHERE sequence = 4`,
        ),
      ),
    'entry-altered',
  ],
  [
    'a changed number in a table',
    (path) =>
      editFile(path, (db) => db.exec(`UPDATE claim SET body = replace(body, '"value":"1.8"', '"value":"1.9"')`)),
    'record-altered',
  ],
  [
    'a changed byte of an imported file',
    (path) =>
      editPastTriggers(path, 'content', (db) =>
        db.exec(
          `UPDATE content SET bytes = CAST(bytes || ' ' AS BLOB) WHERE digest = (SELECT content_digest FROM dataset WHERE id = 1)`,
        ),
      ),
    'content-altered',
  ],
  [
    'a removed last entry',
    (path) =>
      editPastTriggers(path, 'trail', (db) => {
        db.exec('DELETE FROM trail WHERE sequence = (SELECT max(sequence) FROM trail)');
        db.exec('UPDATE head SET (sequence, hash) = (SELECT sequence, hash FROM trail ORDER BY sequence DESC LIMIT 1)');
      }),
    'record-without-entry',
  ],
  [
    'a swapped pair of entries',
    (path) =>
      editPastTriggers(path, 'trail', (db) => {
        db.exec('UPDATE trail SET sequence = 100 WHERE sequence = 2');
        db.exec('UPDATE trail SET sequence = 2 WHERE sequence = 3');
        db.exec('UPDATE trail SET sequence = 3 WHERE sequence = 100');
      }),
    'entry-order',
  ],
];

describe('verify and recheck of the built command line', () => {
  const prepared = workingFolder();
  beforeAll(() => prepareReview(prepared));

  it.each(tampering)('finds %s and ends with status 1', async (_, tamper, code) => {
    const folder = copyOf(prepared);
    tamper(join(folder, project));
    const ran = await footing(folder, ['verify', project, '--json']);
    expect(ran).toMatchObject({ status: 1, errors: '' });
    const report = JSON.parse(ran.out) as { isSound: boolean; problems: { code: string }[] };
    expect(report.isSound).toBe(false);
    expect(report.problems.map((problem) => problem.code)).toContain(code);
  });

  it('says in words too what was found', async () => {
    const folder = copyOf(prepared);
    editFile(join(folder, project), (db) => db.exec(`UPDATE claim SET body = json_set(body, '$.seed', 2)`));
    const { status, out } = await footing(folder, ['verify', project]);
    expect(status).toBe(1);
    expect(out).toMatch(/^record-altered {2}claim 1: .*\nNOT SOUND: \d+ entries, \d+ records, \d+ contents; head \d+ /);
  });

  it.each(['a text', 'an empty file', 'another database'])('ends with status 3 on %s', async (kind) => {
    const folder = copyOf(prepared);
    const path = join(folder, 'other.footing');
    if (kind === 'another database') editFile(path, (db) => db.exec('CREATE TABLE tides (metres REAL)'));
    else writeFileSync(path, kind === 'a text' ? 'Not a project.\n'.repeat(50) : '');
    for (const command of ['verify', 'recheck', 'series']) {
      const ran = await footing(folder, [command, 'other.footing']);
      expect(ran, command).toMatchObject({ status: 3, out: '' });
      expect(ran.errors, command).toMatch(/other\.footing: expected a Footing project, but found /);
    }
  });

  it('recheck refuses a stored answer whose digest no longer holds', async () => {
    const folder = copyOf(prepared);
    editPastTriggers(join(folder, project), 'content', (db) => {
      db.exec(`UPDATE content SET bytes = CAST(replace(CAST(bytes AS TEXT), '"isReproduced":', '"isReproduced" :') AS BLOB)
        WHERE digest = (SELECT answer_digest FROM result ORDER BY id LIMIT 1 OFFSET 1)`);
    });
    const ran = await footing(folder, ['recheck', project]);
    expect(ran).toMatchObject({ status: 3, out: '' });
    expect(ran.errors).toMatch(/content/);
  });
});
