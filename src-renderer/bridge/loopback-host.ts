import type { ProgressEvent } from '../../src-main/contract/events.ts';
import type { Host } from './host-shape.ts';

/** Requests to the program that served this page: one POST each, progress as server-sent events. */
export function loopbackHost(): Host {
  const progressListeners = new Set<(event: ProgressEvent) => void>();
  const absenceListeners = new Set<(isAway: boolean) => void>();
  let isAway = false;

  const tellAbsence = (nowAway: boolean) => {
    if (nowAway === isAway) return;
    isAway = nowAway;
    for (const listener of absenceListeners) listener(nowAway);
  };

  const events = new EventSource('/progress');
  events.addEventListener('open', () => tellAbsence(false));
  events.addEventListener('error', () => tellAbsence(true));
  events.addEventListener('message', ({ data }: MessageEvent<string>) => {
    const event = JSON.parse(data) as ProgressEvent;
    for (const listener of progressListeners) listener(event);
  });

  return {
    async send(name, inputJson) {
      try {
        const response = await fetch(`/request/${name}`, {
          method: 'POST',
          headers: { 'content-type': 'application/json' },
          body: inputJson,
        });
        // Only answers are JSON; a page of words means that this window's session is over.
        if (!response.headers.get('content-type')?.startsWith('application/json')) throw new Error('no answer');
        const answer = await response.text();
        tellAbsence(false);
        return answer;
      } catch (error) {
        tellAbsence(true);
        throw error;
      }
    },
    onProgress: (listener) => subscribe(progressListeners, listener),
    onAbsence: (listener) => subscribe(absenceListeners, listener),
  };
}

function subscribe<Listener>(listeners: Set<Listener>, listener: Listener): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
