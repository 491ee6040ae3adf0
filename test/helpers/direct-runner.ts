import type { ProgressEvent } from '../contract/events.ts';
import type { JobRunner } from './job.ts';
import { runMethod } from './methods.ts';

/** Runs jobs where they are asked for: for the command line, which has nobody to keep waiting, and for tests. */
export function directRunner(): JobRunner {
  const listeners = new Set<(event: ProgressEvent) => void>();
  return {
    run: async (method, input, { jobId = '', label }) => {
      const tell = (shareDone: number, isFinished: boolean) => {
        for (const listener of listeners) listener({ jobId, label, shareDone, secondsLeft: null, isFinished });
      };
      try {
        return runMethod(method, input, (shareDone) => tell(shareDone, false));
      } finally {
        tell(1, true);
      }
    },
    cancel: () => false,
    onProgress(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    close: async () => listeners.clear(),
  };
}
