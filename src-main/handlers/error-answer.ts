import type { ErrorAnswer } from '../contract/requests.ts';
import { isFootingError } from '../errors.ts';
import { JobCancelled } from '../jobs/job.ts';

/** Whatever was thrown, as an error that can be answered with. */
export function errorAnswer(error: unknown, where: string): ErrorAnswer {
  if (isFootingError(error)) {
    const { hint = '', ...fields } = error.fields;
    return { kind: error.name, ...fields, hint };
  }
  const message = error instanceof Error ? error.message : String(error);
  if (error instanceof JobCancelled) {
    return {
      kind: 'Cancelled',
      code: 'cancelled',
      where,
      expected: 'a finished computation',
      received: message,
      hint: '',
    };
  }
  return {
    kind: 'ProjectError',
    code: 'unexpected',
    where,
    expected: 'an answer',
    received: `a fault in Footing itself: ${message}`,
    hint: 'Nothing was stored by this step. Please report the fault with these words.',
  };
}
