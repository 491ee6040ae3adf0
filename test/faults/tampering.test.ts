import { createHash } from 'node:crypto';
import { readFileSync, rmSync, truncateSync, writeFileSync } from 'node:fs';
import type Database from 'better-sqlite3';
import { describe, expect, it } from 'vitest';
import { recordKind, type VerifyReport } from '../../src-main/contract/trail.ts';
import { ProjectError } from '../../src-main/errors.ts';
import { openProject } from '../../src-main/project/open-project.ts';
import { readProjectTitle } from '../../src-main/project/read-project-title.ts';
import { verifyProject } from '../../src-main/project/verify-project.ts';
import { editFile, editPastTriggers } from '../helpers/edit-past-triggers.ts';
import { holder, signedProject } from '../helpers/sample-project.ts';

/** A closed, sound project of nine entries: source, data, claim, result, mark, note, finding, sign-off. */
function closedProject(): string {
  const project = signedProject();
  project.close();
  return project.path;
}

/** Changes one byte of the file where `text` stands in it. */
function flipByteIn(path: string, text: string): void {
  const bytes = readFileSync(path);
  const at = bytes.indexOf(text);
  expect(at, `"${text}" stands in the file`).toBeGreaterThan(0);
  bytes[at] = bytes.readUInt8(at) ^ 1;
  writeFileSync(path, bytes);
}

function found({ problems }: VerifyReport): string[] {
  return problems.map(({ code, where }) => `${code} @ ${where}`);
}

function codeOnOpening(path: string): string {
  try {
    openProject(path, { holder }).close();
    return 'opened';
  } catch (error) {
    if (error instanceof ProjectError) return error.fields.code;
    throw error;
  }
}

describe('a changed trail', () => {
  it('names the entry in which one byte was flipped, and no other entry', () => {
    const path = closedProject();
    flipByteIn(path, '"subject":"claim 1 · window"');
    expect(found(verifyProject(path))).toEqual([
      'entry-altered @ trail entry 6',
      // The entry can no longer be read as one, so nothing accounts for the mark that it made.
      'record-without-entry @ mark 1',
      'record-altered @ numbering of mark',
    ]);
  });

  it('names an entry whose words were changed but still read well', () => {
    const path = closedProject();
    editPastTriggers(path, 'trail', (db) =>
      db.exec(`UPDATE trail SET entry = replace(entry, 'R. Example', 'R. Somebody') WHERE sequence = 4`),
    );
    expect(found(verifyProject(path))).toEqual(['entry-altered @ trail entry 4']);
  });

  it('names the entry after one that was changed together with its hash', () => {
    const path = closedProject();
    editPastTriggers(path, 'trail', (db) => rehash(db, 4, 'R. Example', 'R. Somebody'));
    const report = verifyProject(path);
    expect(found(report)).toEqual(['entry-altered @ trail entry 5']);
    expect(report.problems[0]?.detail).toContain('entry 4');
  });

  it('names a removed last entry, and what it accounted for', () => {
    const path = closedProject();
    editPastTriggers(path, 'trail', (db) => db.exec('DELETE FROM trail WHERE sequence = 9'));
    expect(found(verifyProject(path))).toEqual([
      'entry-missing @ trail entry 9',
      'record-altered @ finding 1',
      'record-without-entry @ signature 1',
      'record-altered @ numbering of signature',
      expect.stringMatching(/^content-without-entry @ content [0-9a-f]{64}$/),
    ]);
    const project = openProject(path, { holder });
    expect(() => project.command({ ...entryInfo }, (change) => change.remove('note', 1))).toThrow(
      /trail: expected entry 9/,
    );
    project.close();
  });

  it('names what a removed last entry leaves behind when the head was set back too', () => {
    const path = closedProject();
    editPastTriggers(path, 'trail', (db) => {
      db.exec('DELETE FROM trail WHERE sequence = 9');
      db.exec('UPDATE head SET sequence = 8, hash = (SELECT hash FROM trail WHERE sequence = 8)');
    });
    expect(found(verifyProject(path))).toContain('record-without-entry @ signature 1');
  });

  it('names a removed entry in the middle', () => {
    const path = closedProject();
    editPastTriggers(path, 'trail', (db) => db.exec('DELETE FROM trail WHERE sequence = 7'));
    expect(found(verifyProject(path))).toEqual([
      'entry-missing @ trail entry 7',
      'record-without-entry @ note 1',
      'record-altered @ numbering of note',
    ]);
  });

  it('names both of a swapped pair', () => {
    const path = closedProject();
    editPastTriggers(path, 'trail', (db) => {
      db.exec('UPDATE trail SET sequence = 100 WHERE sequence = 6');
      db.exec('UPDATE trail SET sequence = 6 WHERE sequence = 7');
      db.exec('UPDATE trail SET sequence = 7 WHERE sequence = 100');
    });
    expect(found(verifyProject(path))).toEqual(['entry-order @ trail entry 6', 'entry-order @ trail entry 7']);
  });

  it('names a swapped pair whose own numbers were changed to fit', () => {
    const path = closedProject();
    editPastTriggers(path, 'trail', (db) => {
      db.exec('UPDATE trail SET sequence = 100 WHERE sequence = 6');
      db.exec(
        `UPDATE trail SET sequence = 6, entry = replace(entry, '"sequence":7', '"sequence":6') WHERE sequence = 7`,
      );
      db.exec(
        `UPDATE trail SET sequence = 7, entry = replace(entry, '"sequence":6', '"sequence":7') WHERE sequence = 100`,
      );
    });
    expect(found(verifyProject(path))).toEqual(
      expect.arrayContaining(['entry-altered @ trail entry 6', 'entry-altered @ trail entry 7']),
    );
  });

  it.each([
    ['a changed sequence', 'UPDATE head SET sequence = 5', 'head-mismatch @ head'],
    ['a changed hash', `UPDATE head SET hash = '${'0'.repeat(64)}'`, 'head-mismatch @ head'],
    ['no row', 'DELETE FROM head', 'head-mismatch @ head'],
  ])('names a head with %s', (_, sql, expected) => {
    const path = closedProject();
    editFile(path, (db) => db.exec(sql));
    expect(found(verifyProject(path))).toEqual([expected]);
  });

  it('cannot tell a chain that was rewritten as a whole, but a signature made before can', () => {
    const path = closedProject();
    editPastTriggers(path, 'trail', (db) => {
      for (let sequence = 3; sequence <= 9; sequence++) rehash(db, sequence, 'R. Example', 'R. Somebody');
      db.exec('UPDATE head SET hash = (SELECT hash FROM trail WHERE sequence = 9)');
      for (const table of ['note', 'signature'])
        db.exec(`UPDATE ${table} SET body = replace(body, 'R. Example', 'R. Somebody')`);
    });
    const report = verifyProject(path);
    expect(found(report)).toEqual(['signature-invalid @ signature 1']);

    const unsigned = closedProject();
    editPastTriggers(unsigned, 'trail', (db) => {
      // The sign-off itself is taken out of the file, with all that it brought.
      db.exec('DELETE FROM trail WHERE sequence = 9; DELETE FROM signature');
      db.exec(
        `UPDATE sqlite_sequence SET seq = 0 WHERE name = 'signature'; UPDATE finding SET body = json_set(body, '$.isSigned', json('false'))`,
      );
      for (let sequence = 3; sequence <= 8; sequence++) rehash(db, sequence, 'R. Example', 'R. Somebody');
      db.exec('UPDATE head SET sequence = 8, hash = (SELECT hash FROM trail WHERE sequence = 8)');
      db.exec(`UPDATE note SET body = replace(body, 'R. Example', 'R. Somebody')`);
    });
    editPastTriggers(unsigned, 'content', (db) =>
      db.exec(`DELETE FROM content WHERE CAST(bytes AS TEXT) LIKE '%footing-signed-finding%'`),
    );
    expect(found(verifyProject(unsigned))).toEqual([]);
  });
});

describe('a changed number', () => {
  const numbers: Record<(typeof recordKind.options)[number], string> = {
    project: `json_set(body, '$.createdAt', '2026-01-02T03:04:05.679Z')`,
    source: `json_set(body, '$.file.sizeBytes', 6)`,
    dataset: `json_set(body, '$.nRows', 4)`,
    series: `json_set(body, '$.endYear', 1993)`,
    claim: `json_set(body, '$.statement.value', '1.8')`,
    result: `json_set(body, '$.seed', 7)`,
    mark: `json_set(body, '$.mark', 'met')`,
    note: `json_set(body, '$.text', 'look at 1991 again')`,
    finding: `json_set(body, '$.text', 'The number moves by a half.')`,
    signature: `json_set(body, '$.trailSequence', 7)`,
  };

  it.each(recordKind.options)('is named with its place in table %s', (kind) => {
    const path = closedProject();
    editFile(path, (db) => db.exec(`UPDATE ${kind} SET body = ${numbers[kind]}`));
    const report = verifyProject(path);
    expect(found(report)).toContain(`record-altered @ ${kind} 1`);
    const isUnderSignature = ['claim', 'result', 'mark', 'finding', 'signature'].includes(kind);
    expect(found(report).includes('signature-invalid @ signature 1')).toBe(isUnderSignature);
  });

  it('is told with both values and the entry that says otherwise', () => {
    const path = closedProject();
    editFile(path, (db) => db.exec(`UPDATE claim SET body = ${numbers.claim}`));
    expect(verifyProject(path).problems[0]).toEqual({
      code: 'record-altered',
      where: 'claim 1',
      detail: '$.statement.value is "1.8", but "1.9" by trail entry 4',
    });
  });

  it('is named in the numbering of records', () => {
    const path = closedProject();
    editFile(path, (db) => db.exec(`UPDATE sqlite_sequence SET seq = 5 WHERE name = 'note'`));
    expect(found(verifyProject(path))).toEqual(['record-altered @ numbering of note']);
  });

  it('names records that were put in, taken out, or made unreadable by hand', () => {
    const path = closedProject();
    editFile(path, (db) => {
      db.exec(`INSERT INTO note (id, body) VALUES (2, '{"id":2,"claimId":1,"text":"","author":"","writtenAt":""}')`);
      db.exec('DELETE FROM mark');
      db.pragma('ignore_check_constraints = ON');
      db.exec(`UPDATE project SET body = '{' WHERE id = 1`);
    });
    const report = verifyProject(path);
    for (const problem of ['record-altered @ project 1', 'record-without-entry @ note 2', 'record-missing @ mark 1']) {
      expect(found(report)).toContain(problem);
    }
    expect(codeOnOpening(path)).toBe('damaged');
  });

  it('reads a record that no longer is one as an error, not as a record', () => {
    const path = closedProject();
    editFile(path, (db) => db.exec(`UPDATE series SET body = json_set(body, '$.endYear', 'soon')`));
    const project = openProject(path, { readOnly: true, holder });
    expect(() => project.list('series')).toThrow(/Verify the project/);
    project.close();
  });
});

describe('changed content', () => {
  it('is named when one byte was flipped, also when only asked for', () => {
    const path = closedProject();
    flipByteIn(path, '1991,0.3');
    const name = createHash('sha256').update('year,temp\n1990,0.25\n1991,0.3\n1992,0.28\n').digest('hex');
    expect(found(verifyProject(path))).toEqual([`content-altered @ content ${name}`]);
    const project = openProject(path, { holder });
    expect(() => project.content(name)).toThrow(ProjectError);
    project.close();
  });

  it('is named when it was removed or added', () => {
    const path = closedProject();
    editPastTriggers(path, 'content', (db) => {
      db.exec(`DELETE FROM content WHERE digest = (SELECT values_digest FROM series)`);
      db.exec(
        `INSERT INTO content (digest, bytes) VALUES ('${createHash('sha256').update('x').digest('hex')}', CAST('x' AS BLOB))`,
      );
    });
    const codes = verifyProject(path).problems.map(({ code }) => code);
    expect(codes).toContain('content-missing');
    expect(codes).toContain('content-without-entry');
  });

  it('makes a signature invalid when it is the answer of a cited result', () => {
    const path = closedProject();
    flipByteIn(path, '{"unit":"K per doubling","value":1.88}');
    const { signatures } = verifyProject(path);
    expect(signatures).toMatchObject([{ isValid: false, reason: 'the answer of result 1 is missing or was altered' }]);
  });
});

describe('a changed file', () => {
  it.each([
    ['a dropped trigger', 'DROP TRIGGER trail_refuses_update', 'trigger trail_refuses_update is missing'],
    ['an extra view', 'CREATE VIEW harmless AS SELECT 1', 'view harmless does not belong here'],
    ['an extra index', 'CREATE INDEX extra ON note (id)', 'index extra does not belong here'],
    [
      'an extra trigger',
      'CREATE TRIGGER extra AFTER INSERT ON trail BEGIN SELECT 1; END',
      'trigger extra does not belong here',
    ],
    ['an extra column', 'ALTER TABLE note ADD COLUMN remark TEXT', 'table note was changed'],
    [
      'a view in place of a table',
      'DROP TABLE note; CREATE VIEW note AS SELECT 1 AS id, 2 AS body',
      'table note is missing',
    ],
  ])('with %s is refused, and verified all the same', (_, sql, difference) => {
    const path = closedProject();
    editFile(path, (db) => {
      db.exec(sql);
      db.exec(`UPDATE claim SET body = json_set(body, '$.seed', 2)`);
    });
    expect(codeOnOpening(path)).toBe('foreign-schema');
    expect(readProjectTitle(path)).toBeNull();
    const report = verifyProject(path);
    expect(report.problems[0]).toEqual({ code: 'schema', where: 'schema', detail: difference });
    expect(found(report)).toContain('record-altered @ claim 1');
  });

  it('with another application id is refused, and verified all the same', () => {
    const path = closedProject();
    editFile(path, (db) => db.pragma('application_id = 1'));
    expect(codeOnOpening(path)).toBe('other-application');
    expect(found(verifyProject(path))).toEqual(['schema @ file header']);
  });

  it('switched to another journal is refused, and verified all the same', () => {
    const path = closedProject();
    editFile(path, (db) => db.pragma('journal_mode = WAL'));
    expect(codeOnOpening(path)).toBe('other-application');
    expect(found(verifyProject(path))).toEqual(['schema @ file header']);
  });

  it('of a newer version is refused in words that say so', () => {
    const path = closedProject();
    editFile(path, (db) => db.pragma('user_version = 2'));
    expect(codeOnOpening(path)).toBe('newer-version');
    expect(() => verifyProject(path)).toThrow(/newer Footing/);
  });

  it('of a version that never was is refused', () => {
    const path = closedProject();
    editFile(path, (db) => db.pragma('user_version = 0'));
    expect(codeOnOpening(path)).toBe('unknown-version');
    expect(found(verifyProject(path))).toEqual(['schema @ file header']);
  });

  it('that was cut short is refused and reported as damaged', () => {
    const path = closedProject();
    truncateSync(path, readFileSync(path).length - 3 * 4096);
    expect(codeOnOpening(path)).toBe('damaged');
    const report = verifyProject(path);
    expect(report.isSound).toBe(false);
    expect(report.problems.map(({ code }) => code)).toContain('file-damaged');
  });

  it.each([
    ['text', 'This is no database.'],
    ['a longer text', 'This is no database. '.repeat(500)],
    ['nothing', ''],
    ['only the first sixteen bytes of one', 'SQLite format 3\0'],
  ])('that holds %s is refused as no project, to verify too', (_, content) => {
    const path = closedProject();
    writeFileSync(path, content);
    expect(codeOnOpening(path)).toBe('not-a-project');
    expect(() => verifyProject(path)).toThrow(/expected a Footing project/);
    expect(readProjectTitle(path)).toBeNull();
  });

  it("that is another program's database is refused, to verify too", () => {
    const path = closedProject();
    rmSync(path);
    editFile(path, (db) => db.exec('CREATE TABLE tides (metres REAL)'));
    expect(codeOnOpening(path)).toBe('other-application');
    expect(() => verifyProject(path)).toThrow(/expected a Footing project, but found a database/);
  });

  it('whose pages were overwritten behind a good header is reported, never crashed on', () => {
    const path = closedProject();
    const bytes = readFileSync(path);
    for (let page = 1; page * 4096 < bytes.length; page++) {
      const damaged = Buffer.from(bytes);
      damaged.fill(0xa5, page * 4096, (page + 1) * 4096);
      writeFileSync(path, damaged);
      expect(verifyProject(path).isSound, `page ${page + 1}`).toBe(false);
    }
  });

  it('that is not there is an error', () => {
    expect(codeOnOpening('/nowhere/at/all.footing')).toBe('not-found');
    expect(() => verifyProject('/nowhere/at/all.footing')).toThrow(ProjectError);
  });
});

const entryInfo = {
  reviewer: { name: 'R. Example', role: '' },
  at: '2026-01-02T03:04:05.678Z',
  engineVersion: '0.0.1',
  action: 'remove note',
  subject: 'note 1',
};

/** Rewrites an entry and gives it the hash that fits, as somebody would who knows how the chain is made. */
function rehash(db: Database.Database, sequence: number, from: string, to: string): void {
  const read = db.prepare<[number], { entry: string; hash: string }>(
    'SELECT entry, hash FROM trail WHERE sequence = ?',
  );
  const entry = read.get(sequence)?.entry.replaceAll(from, to) ?? '';
  const hash = createHash('sha256')
    .update((read.get(sequence - 1)?.hash ?? '') + entry)
    .digest('hex');
  db.prepare('UPDATE trail SET entry = ?, hash = ? WHERE sequence = ?').run(entry, hash, sequence);
}
