import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { computeMethods, type ComputeMethod } from '../../src-main/contract/compute.ts';
import type { ErrorAnswer } from '../../src-main/contract/requests.ts';
import { isFootingError } from '../../src-main/errors.ts';
import { runMethod } from '../../src-main/jobs/methods.ts';
import { testCore, type TestCore } from '../helpers/test-core.ts';

// What a hostile or a hasty user gives to the statistics. Each is refused by name, with what was expected, what came and
// the way out; where a fit does exist, its answer says by a caveat what it lacks. No answer holds NaN.

/** Invented: a line with a wiggle that carries over. */
const nRows = 24;
const x = Array.from({ length: nRows }, (_, t) => t / 10);
const y = x.map((value, t) => 0.4 + 1.7 * value + 0.2 * Math.sin(t * 0.9) + 0.05 * Math.cos(t * 2.3));
const wiggle = y.map((value, t) => value - 0.4 - 1.7 * x[t]!);
const years = x.map((_, t) => 1960 + t);
const line = { x, y, intercept: true };
const serial = { kind: 'newey-west', lag: 2, smallSample: true };

interface Case {
  method: ComputeMethod;
  /** A request without fault. */
  request: Record<string, unknown>;
  /** Code that each fault is refused with. */
  fewRows: string;
  constantPredictor?: string;
  /** `caveat:` before the code of a caveat where the fit exists; `answer` where nothing is lacking. */
  allTied: string;
  /** A lag, a block or a break of n rows. */
  lagOfN?: Record<string, unknown>;
}

const cases: Record<string, Case> = {
  regression: {
    method: 'regression',
    request: { ...line, covariance: serial },
    fewRows: 'too-few-observations',
    constantPredictor: 'rank-deficient',
    allTied: 'caveat:constant-response',
    lagOfN: { covariance: { ...serial, lag: nRows } },
  },
  'regression, automatic lag': {
    method: 'regression',
    request: { ...line, covariance: { ...serial, lag: 'newey-west-1994', prewhiten: 'var1' } },
    fewRows: 'too-few-observations',
    constantPredictor: 'rank-deficient',
    allTied: 'exact-fit',
  },
  'regression, weighted': {
    method: 'regression',
    request: { ...line, covariance: { kind: 'hc3' }, weights: x.map((_, t) => 1 + (t % 3)) },
    fewRows: 'wrong-length',
    constantPredictor: 'rank-deficient',
    allTied: 'caveat:constant-response',
  },
  'residual-tests': {
    method: 'residual-tests',
    request: { ...line, lags: 3 },
    fewRows: 'too-few-observations',
    constantPredictor: 'rank-deficient',
    allTied: 'exact-fit',
    lagOfN: { lags: nRows },
  },
  'effective-sample-size': {
    method: 'effective-sample-size',
    request: { values: wiggle, lags: 3 },
    fewRows: 'too-few-values',
    allTied: 'constant',
    lagOfN: { lags: nRows },
  },
  ...Object.fromEntries(
    ['ml', 'reml', 'prais-winsten', 'cochrane-orcutt'].map((estimator): [string, Case] => [
      `gls-ar1, ${estimator}`,
      {
        method: 'gls-ar1',
        request: { ...line, estimator },
        fewRows: 'too-few-observations',
        constantPredictor: 'rank-deficient',
        allTied: 'exact-fit',
      },
    ]),
  ),
  'gls-arma11': {
    method: 'gls-arma11',
    request: { ...line, estimator: 'ml' },
    fewRows: 'too-few-observations',
    constantPredictor: 'rank-deficient',
    allTied: 'exact-fit',
  },
  'theil-sen': {
    method: 'theil-sen',
    request: { x, y },
    fewRows: 'too-few-values',
    constantPredictor: 'constant',
    allTied: 'constant',
  },
  huber: {
    method: 'huber',
    request: { ...line, k: 1.345 },
    fewRows: 'too-few-observations',
    constantPredictor: 'rank-deficient',
    allTied: 'zero-scale',
  },
  york: {
    method: 'york',
    request: { x, y, sx: 0.05, sy: 0.1 },
    fewRows: 'too-few-values',
    constantPredictor: 'rank-deficient',
    allTied: 'constant',
  },
  deming: {
    method: 'deming',
    request: { x, y, delta: 2 },
    fewRows: 'too-few-values',
    constantPredictor: 'constant',
    allTied: 'constant',
  },
  attenuation: {
    method: 'attenuation',
    request: { x, y, xErrorStandardDeviation: 0.1 },
    fewRows: 'too-few-values',
    constantPredictor: 'constant',
    allTied: 'constant',
  },
  adf: {
    method: 'adf',
    request: { y, lags: 1, deterministic: 'trend' },
    fewRows: 'too-few-values',
    allTied: 'constant',
    lagOfN: { lags: nRows },
  },
  kpss: {
    method: 'kpss',
    request: { y, lags: 2, deterministic: 'constant' },
    fewRows: 'too-few-values',
    allTied: 'exact-fit',
    lagOfN: { lags: nRows },
  },
  'engle-granger': {
    method: 'engle-granger',
    request: { x, y, lags: 1, deterministic: 'constant' },
    fewRows: 'too-few-values',
    constantPredictor: 'rank-deficient',
    allTied: 'exact-fit',
    lagOfN: { lags: nRows },
  },
  reset: {
    method: 'reset',
    request: { ...line, powers: [2, 3] },
    fewRows: 'too-few-observations',
    constantPredictor: 'rank-deficient',
    allTied: 'exact-fit',
  },
  chow: {
    method: 'chow',
    request: { ...line, breakRow: 12 },
    fewRows: 'out-of-range',
    constantPredictor: 'rank-deficient',
    allTied: 'exact-fit',
    lagOfN: { breakRow: nRows },
  },
  cusum: {
    method: 'cusum',
    // A bend, so that the cumulated sum does cross its bound.
    request: { ...line, y: y.map((value, t) => value + Math.max(0, t - 8)), levelPercent: 5 },
    fewRows: 'too-few-observations',
    constantPredictor: 'rank-deficient',
    allTied: 'exact-fit',
  },
  ...Object.fromEntries(
    ['residuals', 'pairs'].map((resample): [string, Case] => [
      `block-bootstrap, ${resample}`,
      {
        method: 'block-bootstrap',
        request: { ...line, blockLength: 3, draws: 100, seed: 5, resample },
        fewRows: 'too-few-values',
        constantPredictor: 'rank-deficient',
        allTied: 'exact-fit',
        lagOfN: { blockLength: nRows },
      },
    ]),
  ),
  'leave-one-out': {
    method: 'leave-one-out',
    request: { ...line, place: 1 },
    fewRows: 'too-few-observations',
    constantPredictor: 'rank-deficient',
    allTied: 'exact-fit',
  },
  'phase-surrogates': {
    method: 'phase-surrogates',
    request: { values: y, draws: 3, seed: 5 },
    fewRows: 'too-few-values',
    allTied: 'constant',
  },
  'window-sweep': {
    method: 'window-sweep',
    request: { ...line, years, minYears: 10, anchor: { kind: 'first-year' }, covariance: serial },
    fewRows: 'no-window',
    constantPredictor: 'no-spread',
    // A slope of zero in each window, which is what is asked for.
    allTied: 'answer',
    lagOfN: { covariance: { ...serial, lag: nRows } },
  },
};
const given = Object.entries(cases).map(([name, one]) => ({ name, ...one }));

let test: TestCore;
beforeAll(async () => {
  test = await testCore();
});
afterAll(() => test.end());

/** As a program on the other side of a pipe sees it. */
async function compute(method: ComputeMethod, input: object): Promise<{ value?: unknown; error?: ErrorAnswer }> {
  const answer = await test.core.handle('compute', JSON.parse(JSON.stringify({ method, ...input })));
  return answer.ok ? { value: answer.value } : { error: answer.error };
}

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
  const others = ['energy-budget', 'derivation', 'recomputation', 'assumptions', 'claim-sweep', 'estimators'];
  const covered = new Set(given.map(({ method }) => method));
  expect([...covered, ...others].sort()).toEqual(Object.keys(computeMethods).sort());
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
  const { method, request } = cases[name]!;
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
  const { method, request } = cases[name]!;
  const { value, error } = await compute(method, { ...request, ...firstRows(request, 2) });
  expect(value).toBeUndefined();
  expect(error?.code).toMatch(/^(too-few-observations|exact-fit)$/);
  expect(error?.hint).toBeTruthy();
});
