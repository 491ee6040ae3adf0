import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { computeMethods, type ComputeMethod } from '../../src-main/contract/compute.ts';
import type { ErrorAnswer } from '../../src-main/contract/requests.ts';
import { schemaOf } from '../../src-main/hosts/command-line/json-schemas.ts';
import { testCore, type TestCore } from './test-core.ts';

export type Compute = (method: string, input: object) => Promise<{ value?: unknown; error?: ErrorAnswer }>;

/** A parameter of a method, and two changes of the request that must give two answers. */
export type TriedParameter<Method extends ComputeMethod> = [Method, string, readonly [object, object]];

/** `footing compute` as a program on the other side of a pipe sees it, for the tests of one file. */
export function computing(): Compute {
  let test: TestCore;
  beforeAll(async () => {
    test = await testCore();
  });
  afterAll(() => test.end());
  return async (method, input) => {
    const request: unknown = JSON.parse(JSON.stringify({ method, ...input }));
    const answer = await test.core.handle('compute', request);
    return answer.ok ? { value: answer.value } : { error: answer.error };
  };
}

/** What every method keeps to; each with a request that it can answer. */
export function testMethods<Method extends ComputeMethod>(
  compute: Compute,
  valid: Readonly<Record<Method, object>>,
): void {
  describe.each(Object.keys(valid) as Method[])('compute %s', (method) => {
    it('answers in its own form, with finite numbers only', async () => {
      const { value } = await compute(method, valid[method]);
      expect(computeMethods[method].value.strict().parse(value)).toEqual(value);
      expect(JSON.stringify(value)).not.toContain('null');
    });

    it('is described by footing schema', () => {
      expect(schemaOf(`compute.${method}`)).toMatchObject({
        type: 'object',
        properties: { method: { const: method } },
      });
      expect(schemaOf(`compute.${method}.value`)).toMatchObject({ type: 'object' });
    });

    it('refuses a field that it does not know', async () => {
      const { error } = await compute(method, { ...valid[method], lag: 2 });
      expect(error).toMatchObject({ code: 'unknown-field', where: method });
    });
  });
}

/** Each parameter away from its plain value, twice: the answer moves, so the parameter arrives. */
export function testParameters<Method extends ComputeMethod>(
  compute: Compute,
  valid: Readonly<Record<Method, object>>,
  parameters: readonly TriedParameter<Method>[],
): void {
  it.each([...parameters])('compute %s uses %s', async (method, _, [one, other]) => {
    const answers = await Promise.all([one, other].map((change) => compute(method, { ...valid[method], ...change })));
    expect(answers.map(({ error }) => error)).toEqual([undefined, undefined]);
    expect(answers[0]?.value).not.toEqual(answers[1]?.value);
  });
}
