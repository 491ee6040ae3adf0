import type { ProgressEvent } from '../../src-main/contract/events.ts';
import type { JobRunner } from '../../src-main/jobs/job.ts';
import { runMethod } from '../../src-main/jobs/methods.ts';

/** Runs jobs where they are asked for: tests have nobody to keep waiting. */
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
