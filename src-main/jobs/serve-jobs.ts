import type { MessagePort } from 'node:worker_threads';
import { isFootingError } from '../errors.ts';
import { methods } from './methods.ts';
import type { JobMessage, JobRequest } from './worker-protocol.ts';

const progressEveryMs = 100;

/** The worker's side: takes one request after the other from the port and answers each. */
export function serveJobs(port: MessagePort): void {
  const send = (message: JobMessage) => port.postMessage(message);
  port.on('message', ({ method, input }: JobRequest) => {
    let lastTold = performance.now();
    const onProgress = (shareDone: number) => {
      const time = performance.now();
      if (time - lastTold < progressEveryMs) return;
      lastTold = time;
      send({ kind: 'progress', shareDone });
    };
    try {
      const run = methods[method] as (input: unknown, onProgress: (shareDone: number) => void) => unknown;
      send({ kind: 'value', value: run(input, onProgress) });
    } catch (error) {
      const message = error instanceof Error ? error.message : String(error);
      const known = isFootingError(error);
      send({
        kind: 'error',
        error: { name: known ? error.name : 'Error', fields: known ? error.fields : null, message },
      });
    }
  });
}
