import { Worker } from 'node:worker_threads';
import type { ProgressEvent } from '../contract/events.ts';
import { InputError, NumericError, ProjectError, type ErrorFields } from '../errors.ts';
import { JobCancelled, type JobOptions, type JobRunner, type RunJob } from './job.ts';
import type { JobMessage, JobRequest } from './worker-protocol.ts';

const errorClasses = { InputError, NumericError, ProjectError };

interface RunningJob {
  options: JobOptions;
  startedAt: number;
  resolve(value: unknown): void;
  reject(error: Error): void;
}

/**
 * Runs jobs one at a time in a worker thread, in the order asked. Cancelling ends the thread, so that it takes effect
 * at once whatever the computation is doing; the next job starts a fresh one.
 */
export function workerRunner(workerFile: string, now: () => number = () => performance.now()): JobRunner {
  const listeners = new Set<(event: ProgressEvent) => void>();
  let worker: Worker | null = null;
  let running: RunningJob | null = null;
  let isClosed = false;
  const waiting: { request: JobRequest; job: RunningJob }[] = [];

  const tell = (job: RunningJob, shareDone: number, isFinished: boolean) => {
    const elapsedSeconds = (now() - job.startedAt) / 1000;
    const secondsLeft = shareDone > 0.02 && !isFinished ? (elapsedSeconds * (1 - shareDone)) / shareDone : null;
    const event = { jobId: job.options.jobId ?? '', label: job.options.label, shareDone, secondsLeft, isFinished };
    for (const listener of listeners) listener(event);
  };

  const finish = (settle: (job: RunningJob) => void) => {
    const job = running;
    if (!job) return;
    running = null;
    tell(job, 1, true);
    settle(job);
    startNext();
  };

  const startWorker = (): Worker => {
    const started = new Worker(workerFile);
    started.on('message', (message: JobMessage) => {
      if (message.kind === 'progress') {
        if (running) tell(running, message.shareDone, false);
      } else if (message.kind === 'value') {
        finish((job) => job.resolve(message.value));
      } else {
        finish((job) => job.reject(revive(message.error)));
      }
    });
    started.on('error', (error: Error) => {
      worker = null;
      finish((job) => job.reject(error));
    });
    started.unref();
    return started;
  };

  function startNext(): void {
    if (running) return;
    const next = waiting.shift();
    if (!next) {
      worker?.unref();
      return;
    }
    running = next.job;
    running.startedAt = now();
    worker ??= startWorker();
    worker.ref();
    tell(running, 0, false);
    worker.postMessage(next.request);
  }

  const run: RunJob = (method, input, options) =>
    new Promise((resolve, reject) => {
      const job: RunningJob = { options, startedAt: now(), resolve: resolve, reject };
      if (isClosed) {
        reject(new JobCancelled(options.label));
        return;
      }
      waiting.push({ request: { method, input }, job });
      startNext();
    });

  return {
    run,
    cancel(jobId) {
      const place = waiting.findIndex(({ job }) => job.options.jobId === jobId);
      const [queued] = place >= 0 ? waiting.splice(place, 1) : [];
      if (queued) {
        queued.job.reject(new JobCancelled(queued.job.options.label));
        return true;
      }
      if (running?.options.jobId !== jobId) return false;
      void worker?.terminate();
      worker = null;
      finish((job) => job.reject(new JobCancelled(job.options.label)));
      return true;
    },
    onProgress(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    async close() {
      isClosed = true;
      listeners.clear();
      for (const { job } of waiting.splice(0)) job.reject(new JobCancelled(job.options.label));
      const ended = worker?.terminate();
      worker = null;
      finish((job) => job.reject(new JobCancelled(job.options.label)));
      await ended;
    },
  };
}

/** Errors lose their class on the way out of a worker; the fields do not. */
function revive({ name, fields, message }: { name: string; fields: ErrorFields | null; message: string }): Error {
  return fields && name in errorClasses
    ? new errorClasses[name as keyof typeof errorClasses](fields)
    : new Error(message);
}
