import { computed, inject, shallowRef, type ComputedRef, type InjectionKey, type ShallowRef } from 'vue';
import type { ProgressEvent } from '../../src-main/contract/events.ts';
import type { Reviewer } from '../../src-main/contract/finding.ts';
import type { ProjectView, Session } from '../../src-main/contract/project.ts';
import type { RequestName } from '../../src-main/contract/request-names.ts';
import type { Answer, ErrorAnswer, RequestAnswer, RequestInput } from '../../src-main/contract/requests.ts';
import { host } from '../bridge/host.ts';
import { request } from '../bridge/request.ts';

/** A line that says what has just happened, with a way back where there is one. */
export interface Notice {
  text: string;
  canUndo: boolean;
}

export interface SessionStore {
  session: Readonly<ShallowRef<Session | null>>;
  project: ComputedRef<ProjectView | null>;
  reviewer: ComputedRef<Reviewer | null>;
  /** Jobs that are running now, oldest first. */
  work: Readonly<ShallowRef<readonly ProgressEvent[]>>;
  notice: ShallowRef<Notice | null>;
  /** Sends a request. Whatever it changes in the project is in `project` when the answer arrives. */
  ask: <Name extends RequestName>(name: Name, input: RequestInput<Name>) => Promise<Answer<Name>>;
  load: () => Promise<ErrorAnswer | null>;
  undo: () => Promise<void>;
  redo: () => Promise<void>;
  cancel: (jobId: string) => Promise<void>;
  /** Stops listening to the host. */
  close: () => void;
}

export const sessionKey: InjectionKey<SessionStore> = Symbol('session');

/** The session of this window: who is reviewing, the open project, and what is running. */
export function useSession(): SessionStore {
  const store = inject(sessionKey);
  if (!store) throw new Error('useSession: no session was provided to this part of the screen');
  return store;
}

export function createSession(): SessionStore {
  const session = shallowRef<Session | null>(null);
  const work = shallowRef<readonly ProgressEvent[]>([]);
  const notice = shallowRef<Notice | null>(null);
  let sent = 0;
  let adopted = 0;

  const change = (part: Partial<Session>) => {
    if (session.value) session.value = { ...session.value, ...part };
  };
  const refresh = () => ask('project.view', {});

  /** What an answer changes in the session. Requests that are absent change nothing that the frame shows. */
  const afterwards: { [Name in RequestName]?: (value: RequestAnswer<Name>, number: number) => unknown } = {
    'session.get': (value) => (session.value = value),
    'reviewer.set': (reviewer) => change({ reviewer }),
    'identity.create': (reviewer) => change({ reviewer }),
    'project.create': adopt,
    'project.open': adopt,
    'project.openDemo': adopt,
    'project.view': adopt,
    'project.rename': adopt,
    'project.close': () => change({ project: null }),
    'source.save': adopt,
    'source.remove': adopt,
    'data.import': ({ project }, number) => adopt(project, number),
    'dataset.remove': adopt,
    'series.update': adopt,
    'series.rebase': ({ project }, number) => adopt(project, number),
    'claim.create': refresh,
    'claim.update': refresh,
    'claim.remove': adopt,
    'claim.derive': refresh,
    'claim.recompute': refresh,
    'claim.testAssumptions': refresh,
    'claim.sweep': refresh,
    'claim.compareEstimators': refresh,
    'claim.mark': refresh,
    'note.add': refresh,
    'note.remove': refresh,
    'finding.save': refresh,
    'finding.sign': refresh,
    'finding.revise': refresh,
    'trail.undo': adopt,
    'trail.redo': adopt,
  };

  /** An answer to an earlier request than the one last shown is late, and is not shown. */
  function adopt(project: ProjectView, number: number): void {
    if (number < adopted) return;
    adopted = number;
    change({ project });
  }

  async function ask<Name extends RequestName>(name: Name, input: RequestInput<Name>): Promise<Answer<Name>> {
    const number = ++sent;
    const answer = await request(name, input);
    if (answer.ok) await afterwards[name]?.(answer.value, number);
    return answer;
  }

  async function step(
    name: 'trail.undo' | 'trail.redo',
    words: string | null | undefined,
    verb: string,
  ): Promise<void> {
    if (!words) return;
    const answer = await ask(name, {});
    notice.value = answer.ok
      ? { text: `${verb}: ${words}.`, canUndo: name === 'trail.redo' }
      : {
          text: `${answer.error.where}: expected ${answer.error.expected}, but found ${answer.error.received}.`,
          canUndo: false,
        };
  }

  const stopListening = host().onProgress((event) => {
    const isKnown = work.value.some(({ jobId }) => jobId === event.jobId);
    if (event.isFinished) work.value = work.value.filter(({ jobId }) => jobId !== event.jobId);
    else if (isKnown) work.value = work.value.map((job) => (job.jobId === event.jobId ? event : job));
    else work.value = [...work.value, event];
  });

  return {
    session,
    project: computed(() => session.value?.project ?? null),
    reviewer: computed(() => session.value?.reviewer ?? null),
    work,
    notice,
    ask,
    load: async () => {
      const answer = await ask('session.get', {});
      return answer.ok ? null : answer.error;
    },
    undo: () => step('trail.undo', session.value?.project?.undo, 'Taken back'),
    redo: () => step('trail.redo', session.value?.project?.redo, 'Done again'),
    cancel: async (jobId) => {
      await ask('job.cancel', { jobId });
    },
    close: stopListening,
  };
}
