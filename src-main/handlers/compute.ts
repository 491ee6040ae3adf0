import type { z } from 'zod';
import { computeMethods, type ComputeInput, type ComputeMethod } from '../contract/compute.ts';
import { InputError } from '../errors.ts';
import type { Handlers } from './context.ts';
import { inputProblem } from './input-problem.ts';

export const computeHandlers: Handlers<'compute'> = {
  /** One stateless computation: nothing is read from a project, nothing is stored. */
  async compute({ method, ...input }, { jobs }) {
    if (!isMethod(method)) {
      throw new InputError({
        code: 'unknown-method',
        where: 'method',
        expected: `one of ${Object.keys(computeMethods).join(', ')}`,
        received: method.slice(0, 80),
        hint: 'footing schema compute lists each with its inputs.',
      });
    }
    const schema: z.ZodType = computeMethods[method].input;
    const parsed = schema.safeParse(input);
    if (!parsed.success) throw new InputError(inputProblem(method, parsed.error));
    const value = await jobs.run(method, parsed.data as ComputeInput<ComputeMethod>, { label: `Computing ${method}` });
    return JSON.parse(JSON.stringify(value)) as z.infer<z.ZodJSONSchema>;
  },
};

function isMethod(method: string): method is ComputeMethod {
  return Object.hasOwn(computeMethods, method);
}
