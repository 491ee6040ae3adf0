import type { z } from 'zod';
import type { ErrorAnswer } from '../contract/requests.ts';

/** The first thing wrong with an input, as error fields: where in it, what was expected, what came. */
export function inputProblem(name: string, error: z.ZodError): ErrorAnswer {
  const [issue] = error.issues;
  const path = issue?.path.map((step) => (typeof step === 'number' ? `[${step}]` : `.${String(step)}`)).join('') ?? '';
  const message = issue?.message ?? 'another form';
  const split = /^Invalid input: expected (.*), received (.*)$/.exec(message);
  return {
    kind: 'InputError',
    code: 'input-form',
    where: `${name}${path}`,
    expected: split?.[1] ?? message,
    received: split?.[2] ?? 'something else',
    hint: error.issues.length > 1 ? `${error.issues.length - 1} more problem(s) of this kind in the same input.` : '',
  };
}
