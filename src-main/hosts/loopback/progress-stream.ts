import type { ServerResponse } from 'node:http';
import type { Core } from '../../handlers/handle.ts';

export interface ProgressStream {
  /** Keeps a response open and tells it everything from now on. */
  add(response: ServerResponse): void;
  close(): void;
}

/** What running jobs tell, as server-sent events, to every open page. */
export function createProgressStream(core: Core): ProgressStream {
  const responses = new Set<ServerResponse>();

  const stopListening = core.onProgress((event) => {
    for (const response of responses) {
      // A page that cannot keep up misses steps, but never the end.
      if (response.writableNeedDrain && !event.isFinished) continue;
      response.write(`data: ${JSON.stringify(event)}\n\n`);
    }
  });

  return {
    add(response) {
      response.writeHead(200, { 'content-type': 'text/event-stream' });
      response.write('retry: 1000\n\n');
      responses.add(response);
      response.on('close', () => responses.delete(response));
    },
    close() {
      stopListening();
      for (const response of responses) response.end();
    },
  };
}
