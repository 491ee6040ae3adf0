import { z } from 'zod';

/** What a running job tells; sent at least five times a second while there is something to tell. */
export const progressEvent = z.object({
  jobId: z.string(),
  label: z.string(),
  shareDone: z.number().min(0).max(1),
  /** null until enough has been done to say. */
  secondsLeft: z.number().nullable(),
  isFinished: z.boolean(),
});
export type ProgressEvent = z.infer<typeof progressEvent>;
