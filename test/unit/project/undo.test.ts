import { describe, expect, it } from 'vitest';
import { isFootingError } from '../../../src-main/errors.ts';
import type { Project } from '../../../src-main/project/project.ts';
import { openProject } from '../../../src-main/project/open-project.ts';
import { signFinding } from '../../../src-main/project/sign-finding.ts';
import { verifyProject } from '../../../src-main/project/verify-project.ts';
import {
  addClaim,
  addFinding,
  doing,
  emptyProject,
  holder,
  importSample,
  sampleSigner,
  signedProject,
} from '../../helpers/sample-project.ts';

function rename(project: Project, title: string): void {
  project.command({ ...doing, action: 'rename project', subject: title }, (change) =>
    change.put('project', { ...project.get('project', 1), title }),
  );
}

function refusalOf(work: () => void): string {
  try {
    work();
  } catch (error) {
    if (isFootingError(error)) return `${error.fields.code}: ${error.fields.received}`;
    throw error;
  }
  return 'none';
}

const titleOf = (project: Project) => project.get('project', 1).title;

describe('undo and redo', () => {
  it('go back and forth as entries of their own, and say what is next', () => {
    const project = emptyProject();
    expect(project.undoState()).toEqual({ undo: null, redo: null });
    rename(project, 'A');
    rename(project, 'B');
    expect(project.undoState()).toEqual({ undo: 'rename project · B', redo: null });

    project.undo(doing);
    expect(titleOf(project)).toBe('A');
    expect(project.undoState()).toEqual({ undo: 'rename project · A', redo: 'rename project · B' });
    project.undo(doing);
    expect(titleOf(project)).toBe('Invented review');
    expect(project.undoState()).toEqual({ undo: null, redo: 'rename project · A' });
    expect(refusalOf(() => project.undo(doing))).toBe('nothing-to-undo: nothing');

    project.redo(doing);
    project.redo(doing);
    expect(titleOf(project)).toBe('B');
    expect(project.undoState()).toEqual({ undo: 'rename project · B', redo: null });
    expect(refusalOf(() => project.redo(doing))).toBe('nothing-to-redo: nothing');

    project.undo(doing);
    expect(titleOf(project)).toBe('A');
    expect(
      project
        .trailLines({ limit: 10 })
        .map(({ sequence, action, subject, undoes, isUndone, canUndo }) => [
          sequence,
          action,
          subject,
          undoes,
          isUndone,
          canUndo,
        ]),
    ).toEqual([
      [8, 'undo', 'entry 7: rename project · B', 7, false, false],
      [7, 'redo', 'entry 4: rename project · B', 4, true, false],
      [6, 'redo', 'entry 5: rename project · A', 5, false, true],
      [5, 'undo', 'entry 2: rename project · A', 2, true, false],
      [4, 'undo', 'entry 3: rename project · B', 3, false, false],
      [3, 'rename project', 'B', null, true, false],
      [2, 'rename project', 'A', null, false, false],
      [1, 'create project', 'Invented review', null, false, false],
    ]);
    expect(verifyProject(project.path).problems).toEqual([]);
  });

  it('end what could be redone when something else is done', () => {
    const project = emptyProject();
    rename(project, 'A');
    project.undo(doing);
    rename(project, 'C');
    expect(project.undoState()).toEqual({ undo: 'rename project · C', redo: null });
    project.undo(doing);
    expect(project.undoState()).toEqual({ undo: null, redo: 'rename project · C' });
  });

  it('take an import away whole and bring it back under the same numbers, its bytes kept throughout', () => {
    const project = emptyProject();
    importSample(project);
    const [dataset, series] = [project.get('dataset', 1), project.get('series', 1)];
    project.undo(doing);
    expect(project.list('dataset')).toEqual([]);
    expect(project.content(dataset.contentDigest)).toHaveLength(dataset.sizeBytes);
    project.redo(doing);
    expect([project.get('dataset', 1), project.get('series', 1)]).toEqual([dataset, series]);
    expect(verifyProject(project.path).problems).toEqual([]);
  });

  it('carry over to the next time that the project is opened; a reader is offered neither', () => {
    const project = emptyProject();
    addClaim(project);
    rename(project, 'A');
    project.undo(doing);
    project.close();
    const reader = openProject(project.path, { readOnly: true, holder });
    expect(reader.undoState()).toEqual({ undo: null, redo: null });
    expect(reader.trailLines({ limit: 9 }).some(({ canUndo }) => canUndo)).toBe(false);
    reader.close();
    const again = openProject(project.path, { holder });
    expect(again.undoState()).toEqual({ undo: 'add claim · claim 1', redo: 'rename project · A' });
    again.redo(doing);
    expect(titleOf(again)).toBe('A');
    again.close();
  });

  it('never take back the creation, a signature, or what a signature stands on', () => {
    const project = signedProject();
    expect(project.undoState()).toEqual({ undo: null, redo: null });
    expect(refusalOf(() => project.undo(doing))).toBe(
      'cannot-undo: one that may not: the finding on claim 1 was signed after it (entry 9); revise the finding instead',
    );
  });

  it('still take back what was done on other claims, and after the signature', () => {
    const project = emptyProject();
    addClaim(project);
    addFinding(project, 1);
    addClaim(project, { title: 'Another claim' });
    signFinding(project, { ...doing, findingId: 1, meaning: 'sign-off', remark: '', signer: sampleSigner(1) });
    expect(project.undoState().undo).toBe('add claim · claim 2');
    project.command({ ...doing, action: 'add note', subject: 'claim 1' }, (change) =>
      change.add('note', { claimId: 1, text: 'seen', author: 'R. Example', writtenAt: doing.at }),
    );
    project.undo(doing);
    expect(project.list('note')).toEqual([]);
    project.undo(doing);
    expect(project.list('claim')).toHaveLength(1);
    expect(refusalOf(() => project.undo(doing))).toContain('cannot-undo');
    project.redo(doing);
    expect(project.list('claim')).toHaveLength(2);
    expect(verifyProject(project.path).problems).toEqual([]);
  });
});
