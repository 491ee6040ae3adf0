import { beforeEach, describe, expect, it } from 'vitest';
import type { ProjectView } from '../../../src-main/contract/project.ts';
import { createSession, type SessionStore } from '../../../src-renderer/state/use-session.ts';
import { installFakeHost, Refusal, type FakeHost } from '../../helpers/fake-host.ts';
import { inventedProject, inventedSession } from '../../helpers/invented-project.ts';

const titled = (title: string): ProjectView => ({ ...inventedProject, project: { ...inventedProject.project, title } });

let host: FakeHost;
let session: SessionStore;

beforeEach(async () => {
  host = installFakeHost();
  host.reply('session.get', () => inventedSession);
  session = createSession();
  await session.load();
});

describe('the session', () => {
  it('holds the reviewer and the project of the host', () => {
    expect(session.reviewer.value?.name).toBe('I. Okonedo');
    expect(session.project.value?.claims).toHaveLength(4);
  });

  it('takes the project from the answer of a request that changes it', async () => {
    host.reply('project.rename', ({ title }) => titled(title));
    await session.ask('project.rename', { title: 'Second look' });
    expect(session.project.value?.project.title).toBe('Second look');
    expect(host.inputs('project.view')).toHaveLength(0);
  });

  it('asks for the project when an answer does not carry it', async () => {
    host.reply('project.view', () => titled('With one note more'));
    host.reply('note.add', () => ({}) as never);
    await session.ask('note.add', { claimId: 2, text: 'The roof leaves the sea out.' });
    expect(session.project.value?.project.title).toBe('With one note more');
  });

  it('does not let a late answer overwrite a newer one', async () => {
    let letGo: (project: ProjectView) => void = () => undefined;
    host.reply('project.view', () => new Promise((resolve) => (letGo = resolve)));
    host.reply('project.rename', ({ title }) => titled(title));
    const late = session.ask('project.view', {});
    await session.ask('project.rename', { title: 'Newer' });
    letGo(titled('Older'));
    await late;
    expect(session.project.value?.project.title).toBe('Newer');
  });

  it('keeps what it holds when a request is refused', async () => {
    host.reply('source.remove', () => {
      throw new Refusal({ code: 'source-in-use' });
    });
    const answer = await session.ask('source.remove', { sourceId: 1 });
    expect(answer).toMatchObject({ ok: false, error: { code: 'source-in-use' } });
    expect(session.project.value).toEqual(inventedProject);
  });

  it('is without a project once it was closed', async () => {
    host.reply('project.close', () => ({}));
    await session.ask('project.close', {});
    expect(session.project.value).toBeNull();
    expect(session.reviewer.value).not.toBeNull();
  });
});

describe('undo', () => {
  it('says what was taken back', async () => {
    host.reply('trail.undo', () => ({ ...inventedProject, undo: null, redo: 'mark assumption' }));
    await session.undo();
    expect(session.notice.value).toEqual({
      text: 'Taken back: mark assumption: claim 2 · zero-intercept.',
      canUndo: false,
    });
    expect(session.project.value?.redo).toBe('mark assumption');
  });

  it('asks for nothing when there is nothing to do', async () => {
    await session.redo();
    expect(host.inputs('trail.redo')).toHaveLength(0);
    expect(session.notice.value).toBeNull();
  });
});

describe('running work', () => {
  const job = { jobId: 'a', label: 'Sweeping', shareDone: 0.2, secondsLeft: null, isFinished: false };

  it('is followed from its first word to its last', () => {
    host.tell(job);
    host.tell({ ...job, jobId: 'b', label: 'Testing' });
    host.tell({ ...job, shareDone: 0.6 });
    expect(session.work.value.map(({ jobId, shareDone }) => [jobId, shareDone])).toEqual([
      ['a', 0.6],
      ['b', 0.2],
    ]);
    host.tell({ ...job, shareDone: 1, isFinished: true });
    expect(session.work.value.map(({ jobId }) => jobId)).toEqual(['b']);
  });

  it('is no longer followed after the session was closed', () => {
    session.close();
    host.tell(job);
    expect(session.work.value).toEqual([]);
  });
});
