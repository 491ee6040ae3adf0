import type { ProgressEvent } from '../../src-main/contract/events.ts';
import type { RequestName } from '../../src-main/contract/request-names.ts';
import type { Answer } from '../../src-main/contract/requests.ts';
import type { Core } from '../../src-main/handlers/handle.ts';

export interface FakeCore extends Core {
  /** Everything that reached it, in order. */
  handled: { name: string; input: unknown }[];
  isClosed: boolean;
  tell(event: ProgressEvent): void;
}

/** A core for tests of hosts: answers with what it was asked, unless told otherwise. */
export function fakeCore(
  answer: (name: string, input: unknown) => unknown = (name, input) => ({ name, input }),
): FakeCore {
  const listeners = new Set<(event: ProgressEvent) => void>();
  const core: FakeCore = {
    handled: [],
    isClosed: false,
    async handle(name, input) {
      core.handled.push({ name, input });
      return { ok: true, value: await answer(name, input) } as Answer<RequestName>;
    },
    onProgress(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    close() {
      core.isClosed = true;
      return Promise.resolve();
    },
    tell(event) {
      for (const listener of listeners) listener(event);
    },
  };
  return core;
}
