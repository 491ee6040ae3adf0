import { readFileSync } from 'node:fs';
import { WebR } from 'webr';
import { z } from 'zod';

/** A list of numbers in R comes back as a record of arrays; a matrix column by column. */
export type RNumbers = Record<string, number[]>;

export interface RSession {
  /** For the name of the test: what the numbers were compared with. */
  version: string;
  /** Evaluates R code with the given variables; its value must be a named list of numeric vectors. */
  numbers(code: string, variables?: Record<string, number | number[] | boolean | string>): Promise<RNumbers>;
  close(): void;
}

/**
 * R itself, as WebAssembly, in this process: an implementation that shares nothing with the code under test. It starts
 * in one to two seconds, so a test file starts it once, in beforeAll.
 *
 * @param files  R files whose functions the tests call
 */
export async function startR(...files: URL[]): Promise<RSession> {
  const webR = new WebR({ interactive: false });
  await webR.init();
  for (const file of files) await webR.evalRVoid(readFileSync(file, 'utf8'));
  return {
    version: `R ${await webR.evalRString('as.character(getRversion())')}`,
    async numbers(code, variables = {}) {
      for (const [name, value] of Object.entries(variables)) await webR.objs.globalEnv.bind(name, value);
      const list = await webR.evalR(`lapply(as.list({ ${code} }), as.double)`);
      try {
        return recordOfArrays(await list.toJs());
      } finally {
        await webR.destroy(list);
      }
    },
    close: () => webR.close(),
  };
}

const namedList = z.object({
  names: z.array(z.string()),
  values: z.array(z.object({ values: z.array(z.number()) })),
});

/** R's NA arrives as null and fails here: a reference that is missing must not pass for one. */
function recordOfArrays(list: unknown): RNumbers {
  const { names, values } = namedList.parse(list);
  return Object.fromEntries(names.map((name, i) => [name, values[i]?.values ?? []]));
}
