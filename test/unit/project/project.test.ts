import { existsSync, mkdirSync, readdirSync, readFileSync, symlinkSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { InputError, isFootingError, ProjectError } from '../../../src-main/errors.ts';
import { createProject } from '../../../src-main/project/create-project.ts';
import { digest } from '../../../src-main/project/digest.ts';
import { openProject } from '../../../src-main/project/open-project.ts';
import { readProjectTitle } from '../../../src-main/project/read-project-title.ts';
import { verifyProject } from '../../../src-main/project/verify-project.ts';
import {
  addClaim,
  doing,
  emptyProject,
  holder,
  importSample,
  sampleFile,
  temporaryFolder,
} from '../../helpers/sample-project.ts';

const info = { ...doing, action: 'add note', subject: 'claim 1' };
const noteOn = (claimId: number, text = 'a note') => ({ claimId, text, author: 'R. Example', writtenAt: doing.at });
const newProject = { ...doing, title: 'Invented review', isInvented: true, holder };

function codeOf(work: () => unknown): string {
  try {
    work();
  } catch (error) {
    if (isFootingError(error)) return error.fields.code;
    throw error;
  }
  return 'none';
}

describe('createProject', () => {
  it('makes one file that opens again with its first entry, and nothing beside it', () => {
    const project = emptyProject();
    const head = project.head();
    expect(project.isReadOnly).toBe(false);
    expect(project.get('project', 1)).toEqual({
      id: 1,
      title: 'Invented review',
      isInvented: true,
      createdAt: doing.at,
    });
    expect(project.trailEntry(1)).toMatchObject({
      entry: { action: 'create project', subject: 'Invented review', content: [], undoes: null },
      previousHash: '0'.repeat(64),
      hash: head.hash,
    });
    project.close();
    project.close();
    expect(readdirSync(join(project.path, '..'))).toEqual(['review.footing']);
    const again = openProject(project.path, { holder });
    expect(again.head()).toEqual(head);
    again.close();
    expect(readProjectTitle(project.path)).toBe('Invented review');
  });

  it('overwrites nothing and leaves nothing behind when it is refused', () => {
    const folder = temporaryFolder();
    const path = join(folder, 'taken.footing');
    writeFileSync(path, 'somebody’s text');
    expect(codeOf(() => createProject(path, newProject))).toBe('exists');
    expect(readFileSync(path, 'utf8')).toBe('somebody’s text');
    expect(codeOf(() => createProject(join(folder, 'new.footing'), { ...newProject, title: '' }))).toBe('record-shape');
    expect(codeOf(() => createProject(join(folder, 'no-such-folder', 'new.footing'), newProject))).toBe('not-found');
    expect(readdirSync(folder)).toEqual(['taken.footing']);
  });

  it('clears away the draft that a killed process left', () => {
    const path = join(temporaryFolder(), 'new.footing');
    writeFileSync(`${path}.footing-draft`, 'half a file');
    writeFileSync(`${path}.footing-draft-journal`, 'half a journal');
    createProject(path, newProject).close();
    expect(readdirSync(join(path, '..'))).toEqual(['new.footing']);
  });

  it('copes with names that mean something to SQLite', () => {
    const folder = temporaryFolder();
    for (const name of ['file:x?mode=ro.footing', ':memory:', 'a b%20c#d.footing', 'Größe – 測.footing']) {
      emptyProject(join(folder, name)).close();
      expect(existsSync(join(folder, name)), name).toBe(true);
      expect(verifyProject(join(folder, name)).isSound).toBe(true);
    }
  });
});

describe('openProject', () => {
  it('knows a project by its place, not by the way to it', () => {
    const project = emptyProject();
    const link = join(temporaryFolder(), 'link.footing');
    symlinkSync(project.path, link);
    expect(codeOf(() => openProject(link, { holder }))).toBe('in-use');
    const reader = openProject(link, { readOnly: true, holder });
    expect(reader.path).toBe(project.path);
    expect(codeOf(() => reader.command(info, (change) => change.add('note', noteOn(1))))).toBe('read-only');
    expect(codeOf(() => reader.undo(doing))).toBe('nothing-to-undo');
    reader.close();
  });

  it('refuses a folder', () => {
    const folder = join(temporaryFolder(), 'folder.footing');
    mkdirSync(folder);
    expect(codeOf(() => openProject(folder, { holder }))).toBe('not-found');
  });

  it('shows a reader what a writer beside has committed since', () => {
    const project = emptyProject();
    const reader = openProject(project.path, { readOnly: true, holder });
    expect(reader.trailLines({ limit: 10 })).toHaveLength(1);
    addClaim(project);
    expect(reader.list('claim')).toEqual(project.list('claim'));
    expect(reader.trailLines({ limit: 10 })).toHaveLength(2);
    reader.close();
  });
});

describe('command', () => {
  it('stores changes and entry together, with the state before and after', () => {
    const project = emptyProject();
    addClaim(project);
    const note = project.command(info, (change) => {
      const added = change.add('note', noteOn(1));
      change.put('claim', { ...project.get('claim', 1), seed: 2 });
      return added;
    });
    expect(note).toEqual({ id: 1, ...noteOn(1) });
    const { entry } = project.trailEntry(3);
    expect(entry).toMatchObject({ sequence: 3, ...info, undoes: null });
    expect(entry.changes.map(({ kind, id, before, after }) => [kind, id, before?.['seed'], after?.['seed']])).toEqual([
      ['note', 1, undefined, undefined],
      ['claim', 1, 1, 2],
    ]);
  });

  it('writes one change for a record that was changed twice, and none for one that came back', () => {
    const project = emptyProject();
    const claim = addClaim(project);
    project.command(info, (change) => {
      change.put('claim', { ...claim, seed: 5 });
      change.put('claim', { ...claim, seed: 6 });
      change.remove('note', change.add('note', noteOn(1)).id);
    });
    const { changes } = project.trailEntry(3).entry;
    expect(changes).toHaveLength(1);
    expect(changes[0]).toMatchObject({ before: { seed: 1 }, after: { seed: 6 } });
    project.command(info, (change) => change.put('claim', { ...claim, seed: 6 }));
    expect(project.head().sequence).toBe(3);
    expect(verifyProject(project.path).problems).toEqual([]);
  });

  it('never gives a number out twice', () => {
    const project = emptyProject();
    addClaim(project);
    project.command(info, (change) => change.add('note', noteOn(1)));
    project.command(info, (change) => change.remove('note', 1));
    expect(project.command(info, (change) => change.add('note', noteOn(1))).id).toBe(2);
  });

  it('keeps content once, under its digest', () => {
    const project = emptyProject();
    importSample(project, 'one.csv');
    importSample(project, 'two.csv');
    expect(project.trailEntry(2).entry.content).toHaveLength(2);
    expect(project.trailEntry(3).entry.content).toEqual([]);
    expect(project.content(digest(sampleFile))).toEqual(sampleFile);
    expect(codeOf(() => project.content('f'.repeat(64)))).toBe('content-missing');
  });

  it('undoes all of itself when it fails, and can be followed by another', () => {
    const project = emptyProject();
    const head = project.head();
    const failing = () =>
      project.command(info, (change) => {
        change.addContent(Buffer.from('lost'));
        change.add('source', { title: 'A talk', kind: 'talk', details: '', file: null });
        throw new Error('out of luck');
      });
    expect(failing).toThrow('out of luck');
    expect(project.list('source')).toEqual([]);
    expect(codeOf(() => project.content(digest('lost')))).toBe('content-missing');
    expect(project.head()).toEqual(head);
    addClaim(project);
    expect(project.list('claim')).toHaveLength(1);
    expect(verifyProject(project.path).problems).toEqual([]);
  });

  it('is not visible to others before it is complete', () => {
    const project = emptyProject();
    const reader = openProject(project.path, { readOnly: true, holder });
    project.command(info, (change) => {
      change.add('source', { title: 'A talk', kind: 'talk', details: '', file: null });
      expect(project.list('source')).toHaveLength(1);
      expect(reader.list('source')).toEqual([]);
    });
    expect(reader.list('source')).toHaveLength(1);
    reader.close();
  });

  it.each([
    ['a promise', 'promise-in-command', (project) => project.command(info, () => Promise.resolve(1))],
    [
      'a command inside a command',
      'nested-command',
      (project) => project.command(info, () => project.command(info, () => 1)),
    ],
    [
      'an undo inside a command',
      'nested-command',
      (project) => {
        addClaim(project);
        project.command(info, () => project.undo(doing));
      },
    ],
    [
      'a record that is not one',
      'record-shape',
      (project) => project.command(info, (change) => change.add('note', noteOn(-1))),
    ],
    [
      'a record that is not there',
      'no-such-record',
      (project) => project.command(info, (change) => change.remove('note', 4)),
    ],
    [
      'a reference to nothing',
      'still-referenced',
      (project) => project.command(info, (change) => change.add('note', noteOn(9))),
    ],
    [
      'content that is not there',
      'still-referenced',
      (project) =>
        project.command(info, (change) =>
          change.add('source', {
            title: 'A talk',
            kind: 'talk',
            details: '',
            file: { name: 'x', sizeBytes: 1, digest: 'a'.repeat(64) },
          }),
        ),
    ],
    [
      'half a surrogate pair',
      'not-json',
      (project) =>
        project.command(info, (change) =>
          change.add('source', { title: '\ud800', kind: 'talk', details: '', file: null }),
        ),
    ],
  ] satisfies [string, string, (project: ReturnType<typeof emptyProject>) => unknown][])(
    'refuses %s',
    (_, code, work) => {
      const project = emptyProject();
      expect(codeOf(() => work(project))).toBe(code);
      expect(project.list('note')).toEqual([]);
      expect(verifyProject(project.path).problems).toEqual([]);
      addClaim(project);
    },
  );

  it('says which record stands in the way of removing another', () => {
    const project = emptyProject();
    const seriesId = importSample(project);
    addClaim(project, {
      procedure: {
        kind: 'trend',
        seriesId,
        minMonths: 12,
        window: null,
        covariance: { kind: 'classical' },
        per: 'decade',
      },
    });
    expect(() => project.command(info, (change) => change.remove('series', seriesId))).toThrow(
      'claim 1: expected the series that it refers to, but found none. Remove or change claim 1 first.',
    );
  });

  it('accepts no change once it is over', () => {
    const project = emptyProject();
    const kept = project.command(info, (change) => change);
    expect(codeOf(() => kept.add('source', { title: 'Late', kind: 'talk', details: '', file: null }))).toBe(
      'command-over',
    );
    expect(codeOf(() => kept.addContent(Buffer.from('late')))).toBe('command-over');
    expect(project.list('source')).toEqual([]);
  });
});

describe('reading', () => {
  it('says which record or entry is not there', () => {
    const project = emptyProject();
    expect(() => project.get('claim', 7)).toThrow(InputError);
    expect(() => project.get('claim', 7)).toThrow(
      'claim 7: expected the number of a claim in this project, but found 7.',
    );
    expect(() => project.trailEntry(2)).toThrow('trail entry 2: expected an entry from 1 to 1, but found 2.');
  });

  it('lists the trail from the newest, by claim and page', () => {
    const project = emptyProject();
    addClaim(project);
    addClaim(project);
    for (const claimId of [1, 2, 1]) project.command(info, (change) => change.add('note', noteOn(claimId)));
    const sequences = (filter: { claimId?: number; before?: number; limit: number }) =>
      project.trailLines(filter).map(({ sequence }) => sequence);
    expect(sequences({ limit: 100 })).toEqual([6, 5, 4, 3, 2, 1]);
    expect(sequences({ limit: 2 })).toEqual([6, 5]);
    expect(sequences({ limit: 2, before: 5 })).toEqual([4, 3]);
    expect(sequences({ limit: 100, claimId: 1 })).toEqual([6, 4, 2]);
    expect(sequences({ limit: 1, claimId: 2, before: 6 })).toEqual([5]);
    expect(project.trailLines({ limit: 1 })).toEqual([
      { sequence: 6, ...info, undoes: null, hash: project.head().hash, claimIds: [1], isUndone: false, canUndo: true },
    ]);
  });

  it('after closing is an error of the caller', () => {
    const project = emptyProject();
    project.close();
    expect(() => project.head()).toThrow();
    expect(() => project.head()).not.toThrow(ProjectError);
  });
});
