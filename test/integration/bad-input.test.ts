import { describe, expect, it } from 'vitest';
import { carbonMethods } from '../../src-main/contract/carbon.ts';
import { climateResponseMethods } from '../../src-main/contract/climate-response.ts';
import { computeMethods, type ComputeMethod } from '../../src-main/contract/compute.ts';
import { forcingMethods } from '../../src-main/contract/forcing.ts';
import { isFootingError } from '../../src-main/errors.ts';
import { runMethod } from '../../src-main/jobs/methods.ts';
import { computing } from '../helpers/compute-tests.ts';
import { statisticsCases, x, y } from '../helpers/statistics-cases.ts';

// What a hostile or a hasty user gives to the statistics. Each is refused by name, with what was expected, what came and
// the way out; where a fit does exist, its answer says by a caveat what it lacks. No answer holds NaN.

const given = Object.entries(statisticsCases).map(([name, one]) => ({ name, ...one }));

const compute = computing();

async function expectRefusal(method: ComputeMethod, input: object, code: string): Promise<void> {
  const { value, error } = await compute(method, input);
  expect(value).toBeUndefined();
  expect(error?.code).toBe(code);
  for (const said of [error?.where, error?.expected, error?.received, error?.hint]) expect(said).toBeTruthy();
}

const columnOf = (request: object) => ('values' in request ? 'values' : 'y');
const firstRows = (request: Record<string, unknown>, nKept: number) =>
  Object.fromEntries(
    ['x', 'y', 'values', 'years'].flatMap((name) => {
      const column = request[name];
      return Array.isArray(column) ? [[name, column.slice(0, nKept) as unknown]] : [];
    }),
  );

it('goes through every method of the statistics', () => {
  const climate = Object.keys({ ...forcingMethods, ...carbonMethods, ...climateResponseMethods });
  const ofClaims = ['energy-budget', 'derivation', 'recomputation', 'assumptions', 'claim-sweep', 'estimators'];
  const covered = new Set(given.map(({ method }) => method));
  expect([...covered, ...climate, ...ofClaims].sort()).toEqual(Object.keys(computeMethods).sort());
});

describe.each(given)('$name', ({ method, request, fewRows, constantPredictor, allTied, lagOfN }) => {
  const column = columnOf(request);

  it('answers a request without fault', async () => {
    const { value, error } = await compute(method, request);
    expect(error).toBeUndefined();
    expect(JSON.stringify(value)).not.toContain('null');
  });

  it('refuses fewer rows than it needs', async () => {
    await expectRefusal(method, { ...request, ...firstRows(request, 1) }, fewRows);
  });

  it('refuses a missing value, as null over the pipe and as NaN in the process', async () => {
    for (const name of ['x', 'y', 'values']) {
      const values = request[name];
      if (!Array.isArray(values)) continue;
      await expectRefusal(method, { ...request, [name]: values.with(5, null) }, 'input-form');
      for (const bad of [NaN, Infinity]) {
        const input = { ...request, [name]: values.with(5, bad) };
        let caught: unknown;
        try {
          runMethod(method, input as never, () => undefined);
        } catch (thrown) {
          caught = thrown;
        }
        expect(isFootingError(caught) && caught.fields).toMatchObject({ code: 'not-finite', received: String(bad) });
        expect(isFootingError(caught) && caught.fields.hint).toBeTruthy();
      }
    }
  });

  if (constantPredictor !== undefined) {
    it('refuses a constant predictor', async () => {
      for (const constant of [3, 0]) {
        await expectRefusal(method, { ...request, x: x.map(() => constant) }, constantPredictor);
      }
    });
  }

  if ('x' in request) {
    it('refuses columns of different lengths', async () => {
      await expectRefusal(method, { ...request, x: x.slice(1) }, 'wrong-length');
      await expectRefusal(method, { ...request, y: [...y, 1] }, 'wrong-length');
    });
  }

  if (lagOfN) {
    it('refuses a lag, a block or a break that its rows do not have', async () => {
      await expectRefusal(method, { ...request, ...lagOfN }, 'out-of-range');
    });
  }

  it('takes nothing but ties for no knowledge', async () => {
    // 0.1 is no short binary fraction: its mean is rounded.
    for (const tie of [3, 0.1]) {
      const tied = { ...request, [column]: y.map(() => tie) };
      if (!/^(caveat:|answer$)/.test(allTied)) await expectRefusal(method, tied, allTied);
      else {
        const { value } = await compute(method, tied);
        expect(computeMethods[method].value.parse(value)).toEqual(value);
        const code = allTied.replace('caveat:', '');
        if (code !== allTied)
          expect(value).toMatchObject({
            caveats: expect.arrayContaining([expect.objectContaining({ code })]) as unknown,
          });
      }
    }
  });
});

/** Errors and weights that are none: zero, negative, of another length. */
const badErrors: [string, object, string][] = [
  ['york', { sx: 0, sy: 0 }, 'no-error'],
  ['york', { sx: -0.05 }, 'negative'],
  ['york', { sy: y.map((_, t) => t - 3) }, 'negative'],
  ['york', { sy: [0.1, 0.2] }, 'wrong-length'],
  ['york', { r: 1 }, 'out-of-range'],
  ['york', { r: -1.5 }, 'out-of-range'],
  ['deming', { delta: 0 }, 'out-of-range'],
  ['deming', { delta: -2 }, 'out-of-range'],
  ['attenuation', { xErrorStandardDeviation: -0.1 }, 'out-of-range'],
  ['attenuation', { xErrorStandardDeviation: 5 }, 'no-signal'],
  ['huber', { k: 0 }, 'out-of-range'],
  ['huber', { k: -1 }, 'out-of-range'],
  ['regression', { weights: x }, 'not-positive'],
  ['regression', { weights: x.map((value) => value - 1) }, 'not-positive'],
  ['regression', { weights: [1, 2] }, 'wrong-length'],
  ['leave-one-out', { weights: x }, 'not-positive'],
  ['leave-one-out', { weights: [1, 2] }, 'wrong-length'],
];

it.each(badErrors)('%s refuses %j', async (name, change, code) => {
  const { method, request } = statisticsCases[name]!;
  await expectRefusal(method, { ...request, ...change }, code);
});

/** A line with exactly as many rows as coefficients leaves no errors to judge. */
it.each([
  'regression',
  'regression, automatic lag',
  'residual-tests',
  'gls-ar1, ml',
  'gls-ar1, reml',
  'gls-ar1, prais-winsten',
  'gls-ar1, cochrane-orcutt',
  'gls-arma11',
  'huber',
  'reset',
  'cusum',
])('%s refuses as many rows as coefficients', async (name) => {
  const { method, request } = statisticsCases[name]!;
  const { value, error } = await compute(method, { ...request, ...firstRows(request, 2) });
  expect(value).toBeUndefined();
  expect(error?.code).toMatch(/^(too-few-observations|exact-fit)$/);
  expect(error?.hint).toBeTruthy();
});
