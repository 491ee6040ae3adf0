import type { ComputeInput, ComputeMethod, ComputeValue } from '../contract/compute.ts';
import type { ProgressEvent } from '../contract/events.ts';

export interface JobOptions {
  /** The caller's handle for following and cancelling. */
  jobId?: string | undefined;
  /** What is running, in words: "Testing assumptions of claim 2". */
  label: string;
}

/** Runs one computation, away from whoever asks. */
export type RunJob = <Method extends ComputeMethod>(
  method: Method,
  input: ComputeInput<Method>,
  options: JobOptions,
) => Promise<ComputeValue<Method>>;

export interface JobRunner {
  run: RunJob;
  /** True when a job of this id was running and has been stopped. */
  cancel(jobId: string): boolean;
  onProgress(listener: (event: ProgressEvent) => void): () => void;
  close(): Promise<void>;
}

/** A job that its caller stopped. Not an error of anyone's making. */
export class JobCancelled extends Error {
  override readonly name = 'JobCancelled';

  constructor(label: string) {
    super(`${label} was cancelled. Nothing was stored.`);
  }
}
