import type { z } from 'zod';
import { computeMethods, type ComputeInput, type ComputeMethod } from '../contract/compute.ts';
import { InputError } from '../errors.ts';
import { checkInput } from './check-input.ts';
import type { Handlers } from './context.ts';

export const computeHandlers: Handlers<'compute'> = {
  /** One stateless computation: nothing is read from a project, nothing is stored. */
  async compute({ method, ...input }, { jobs }) {
    if (!isMethod(method)) {
      throw new InputError({
        code: 'unknown-method',
        where: 'method',
        expected: `one of ${Object.keys(computeMethods).join(', ')}`,
        received: method.slice(0, 80),
        hint: 'footing schema lists the inputs of each as compute.<method>.',
      });
    }
    const schema: z.ZodType = computeMethods[method].input;
    const checked = checkInput(method, schema, input);
    const value = await jobs.run(method, checked as ComputeInput<ComputeMethod>, { label: `Computing ${method}` });
    return JSON.parse(JSON.stringify(value)) as z.infer<z.ZodJSONSchema>;
  },
};

function isMethod(method: string): method is ComputeMethod {
  return Object.hasOwn(computeMethods, method);
}
