import type { ComputeMethod } from '../contract/compute.ts';
import type { ErrorFields } from '../errors.ts';

export interface JobRequest {
  method: ComputeMethod;
  input: unknown;
}

export type JobMessage =
  | { kind: 'progress'; shareDone: number }
  | { kind: 'value'; value: unknown }
  | { kind: 'error'; error: { name: string; fields: ErrorFields | null; message: string } };
