import { expect, it } from 'vitest';
import { computeMethods } from '../../src-main/contract/compute.ts';
import type { ErrorAnswer } from '../../src-main/contract/requests.ts';
import { computing, testMethods, testParameters, type TriedParameter } from '../helpers/compute-tests.ts';

/** Invented: a line with a wiggle that carries over. */
const x = Array.from({ length: 24 }, (_, t) => t / 10);
const y = x.map((value, t) =>
  Number((0.4 + 1.7 * value + 0.2 * Math.sin(t * 0.9) + 0.05 * Math.cos(t * 2.3)).toFixed(4)),
);
/** The wiggle alone. */
const wiggle = x.map((value, t) => y[t]! - 0.4 - 1.7 * value);
const same = <Value>(value: Value, length = x.length): Value[] => Array.from({ length }, () => value);
const co2Ppm = x.map((_, t) => 380 + t);
const methane = { ch4Ppb: 1850, ch4RefPpb: 729 };
const nitrousOxide = { n2oPpb: 330, n2oRefPpb: 270 };
const without = (at: number) => y.map((value, t) => (t === at ? null : value));
const withGapAt = (at: number) => x.map((_, t) => 1960 + t + (t < at ? 0 : 2));
/** A bend that a line cannot follow: the cumulated sum crosses its bound. */
const withBend = y.map((value, t) => value + Math.max(0, t - 8));
const onALine = x.map((value) => 2 * value);

const compute = computing();

const valid = {
  regression: { x, y, intercept: true, covariance: { kind: 'newey-west', lag: 2 } },
  'effective-sample-size': { values: wiggle, lags: 3 },
  'residual-tests': { x, y, intercept: true, lags: 3 },
  'gls-ar1': { x, y, intercept: true, estimator: 'ml' },
  'gls-arma11': { x, y, intercept: true, estimator: 'ml' },
  'theil-sen': { x, y },
  huber: { x, y, intercept: true, k: 1.345 },
  york: { x, y, sx: 0.05, sy: 0.1 },
  adf: { y, lags: 1, deterministic: 'trend' },
  kpss: { y, lags: 2, deterministic: 'constant' },
  'block-bootstrap': { x, y, intercept: true, blockLength: 3, draws: 1000, seed: 5 },
  'engle-granger': { x, y, lags: 1, deterministic: 'constant' },
  deming: { x, y, delta: 2 },
  attenuation: { x, y, xErrorStandardDeviation: 0.1 },
  reset: { x, y, intercept: true, powers: [2, 3] },
  chow: { x, y, intercept: true, breakRow: 12 },
  cusum: { x, y: withBend, intercept: true, levelPercent: 5 },
  'leave-one-out': { x, y, intercept: true, place: 1 },
  'phase-surrogates': { values: y, draws: 3, seed: 5 },
  forcing: { formula: 'meinshausen2020', co2Ppm, co2RefPpm: 278, ...methane, ...nitrousOxide },
} as const;
type Method = keyof typeof valid;
const methods = Object.keys(valid) as Method[];

testMethods(compute, valid);

it.each(methods)('compute %s refuses a missing value, and says how one is left out', async (method) => {
  const column = 'values' in valid[method] ? 'values' : 'co2Ppm' in valid[method] ? 'co2Ppm' : 'y';
  const { error } = await compute(method, { ...valid[method], [column]: without(5) });
  expect(error).toMatchObject({ code: 'input-form', where: `${method}.${column}[5]`, received: 'null' });
  expect(error?.hint).toContain('Leave a row with a missing value out');
});

const errors = (covariance: object) => ({ covariance: { kind: 'newey-west', lag: 2, ...covariance } });
const parameters: TriedParameter<Method>[] = [
  ['effective-sample-size', 'lags', [{ lags: 1 }, { lags: 4 }]],
  ['effective-sample-size', 'years', [{ years: withGapAt(5) }, {}]],
  ['regression', 'covariance.lag', [errors({ lag: 4 }), errors({ lag: 'newey-west-1994' })]],
  ['regression', 'covariance.lag', [errors({ lag: 0 }), errors({ lag: 3 })]],
  ['regression', 'covariance.prewhiten', [errors({ prewhiten: 'var1' }), errors({})]],
  ['regression', 'covariance.smallSample', [errors({ smallSample: true }), errors({ smallSample: false })]],
  ['regression', 'covariance.kind', [{ covariance: { kind: 'hc0' } }, { covariance: { kind: 'hc3' } }]],
  ['regression', 'years', [{ years: withGapAt(5) }, { years: withGapAt(15) }]],
  ['regression', 'intercept', [{ intercept: false }, { intercept: true }]],
  ['regression', 'weights', [{ weights: x.map((_, t) => 1 + t) }, { weights: x.map((_, t) => 30 - t) }]],
  ['residual-tests', 'lags', [{ lags: 2 }, { lags: 5 }]],
  ['residual-tests', 'breuschPaganKind', [{ breuschPaganKind: 'original' }, { breuschPaganKind: 'studentised' }]],
  ['residual-tests', 'years', [{ years: withGapAt(5) }, {}]],
  ['residual-tests', 'fitdf', [{ fitdf: 1 }, { fitdf: 2 }]],
  ['residual-tests', 'intercept', [{ intercept: false }, { intercept: true }]],
  ['gls-ar1', 'estimator', [{ estimator: 'reml' }, { estimator: 'prais-winsten' }]],
  ['gls-ar1', 'estimator', [{ estimator: 'cochrane-orcutt' }, { estimator: 'ml' }]],
  ['gls-ar1', 'years', [{ years: withGapAt(5) }, { years: withGapAt(15) }]],
  ['gls-ar1', 'intercept', [{ intercept: false }, { intercept: true }]],
  ['gls-arma11', 'intercept', [{ intercept: false }, { intercept: true }]],
  ['gls-arma11', 'years', [{ years: withGapAt(5) }, { years: withGapAt(15) }]],
  ['block-bootstrap', 'blockLength', [{ blockLength: 2 }, { blockLength: 4 }]],
  ['block-bootstrap', 'draws', [{ draws: 500 }, { draws: 2000 }]],
  ['block-bootstrap', 'seed', [{ seed: 6 }, { seed: 7 }]],
  ['block-bootstrap', 'intercept', [{ intercept: false }, { intercept: true }]],
  ['block-bootstrap', 'resample', [{ resample: 'pairs' }, { resample: 'residuals' }]],
  ['block-bootstrap', 'years', [{ years: withGapAt(5) }, {}]],
  ['huber', 'k', [{ k: 0.8 }, { k: 1.1 }]],
  ['huber', 'intercept', [{ intercept: false }, { intercept: true }]],
  ['york', 'sx', [{ sx: 0.2 }, { sx: x.map((_, t) => 0.1 + t / 100) }]],
  ['york', 'sy', [{ sy: 0.2 }, { sy: x.map((_, t) => 0.1 + t / 100) }]],
  ['york', 'r', [{ r: 0.4 }, { r: x.map((_, t) => -t / 40) }]],
  ['adf', 'lags', [{ lags: 0 }, { lags: 3 }]],
  ['adf', 'years', [{ years: withGapAt(5) }, {}]],
  ['kpss', 'years', [{ years: withGapAt(5) }, {}]],
  ['adf', 'deterministic', [{ deterministic: 'none' }, { deterministic: 'constant' }]],
  ['engle-granger', 'lags', [{ lags: 0 }, { lags: 3 }]],
  ['engle-granger', 'years', [{ years: withGapAt(5) }, {}]],
  ['engle-granger', 'deterministic', [{ x: y.toReversed() }, { x: y.toReversed(), deterministic: 'trend' }]],
  ['deming', 'delta', [{ delta: 0.5 }, { delta: 4 }]],
  ['attenuation', 'xErrorStandardDeviation', [{ xErrorStandardDeviation: 0.2 }, { xErrorStandardDeviation: 0.3 }]],
  ['reset', 'powers', [{ powers: [2] }, { powers: [3, 4] }]],
  ['reset', 'intercept', [{ intercept: false }, { intercept: true }]],
  ['chow', 'breakRow', [{ breakRow: 8 }, { breakRow: 15 }]],
  ['chow', 'intercept', [{ intercept: false }, { intercept: true }]],
  ['cusum', 'levelPercent', [{ levelPercent: 1 }, { levelPercent: 10 }]],
  ['cusum', 'intercept', [{ intercept: false }, { intercept: true }]],
  ['leave-one-out', 'place', [{ place: 0 }, { place: 1 }]],
  ['leave-one-out', 'intercept', [{ intercept: false, place: 0 }, { place: 0 }]],
  ['leave-one-out', 'weights', [{ weights: x.map((_, t) => 1 + t) }, { weights: x.map((_, t) => 30 - t) }]],
  ['phase-surrogates', 'draws', [{ draws: 1 }, { draws: 2 }]],
  ['phase-surrogates', 'seed', [{ seed: 6 }, { seed: 7 }]],
  ['forcing', 'formula', [{ formula: 'ipcc1990' }, { formula: 'myhre1998' }]],
  ['forcing', 'formula', [{ formula: 'etminan2016' }, { formula: 'meinshausen2020' }]],
  ['forcing', 'adjustment', [{ adjustment: 'ar6' }, { adjustment: 'none' }]],
  ['forcing', 'co2Ppm', [{ co2Ppm: 400 }, { co2Ppm: 420 }]],
  ['forcing', 'co2RefPpm', [{ co2RefPpm: 280 }, { co2RefPpm: co2Ppm.toReversed() }]],
  ['forcing', 'ch4Ppb', [{ ch4Ppb: 1900 }, { ch4Ppb: co2Ppm.map((ppm) => 4 * ppm) }]],
  ['forcing', 'ch4RefPpb', [{ ch4RefPpb: 700 }, { ch4RefPpb: 720 }]],
  ['forcing', 'n2oPpb', [{ n2oPpb: 332 }, { n2oPpb: 336 }]],
  ['forcing', 'n2oRefPpb', [{ n2oRefPpb: 271 }, { n2oRefPpb: 272 }]],
  ['kpss', 'lags', [{ lags: 0 }, { lags: 4 }]],
  ['kpss', 'deterministic', [{ deterministic: 'trend' }, { deterministic: 'constant' }]],
];

/** Data, and what has one value only. */
const noParameters = ['x', 'y', 'values', 'gls-arma11.estimator'];

it.each(methods)('every parameter of %s is tried', (method) => {
  const named = (name: string) => !noParameters.includes(name) && !noParameters.includes(`${method}.${name}`);
  const covariance = Object.keys(computeMethods.regression.input.shape.covariance.shape);
  const asked = Object.keys(computeMethods[method].input.shape)
    .filter(named)
    .flatMap((name) => (name === 'covariance' ? covariance.map((option) => `covariance.${option}`) : [name]));
  const tried = new Set(parameters.filter(([of]) => of === method).map(([, name]) => name));
  expect([...tried].sort()).toEqual(asked.sort());
});

testParameters(compute, valid, parameters);

const line = ['residual-tests', 'gls-ar1', 'gls-arma11', 'huber'] as const;
const atOnce = ['deming', 'attenuation'] as const;
const short = { x: [1, 2], y: [1, 3] };
const bad: [Method, string, object, Partial<ErrorAnswer>][] = [
  ...line.map((method): [Method, string, object, Partial<ErrorAnswer>] => [
    method,
    'fewer rows than coefficients',
    { x: [1], y: [2] },
    { code: 'too-few-observations' },
  ]),
  ...line.map((method): [Method, string, object, Partial<ErrorAnswer>] => [
    method,
    'a constant predictor',
    { x: same(3) },
    { kind: 'NumericError', code: 'rank-deficient' },
  ]),
  ...([...line, 'theil-sen', 'york'] as const).map((method): [Method, string, object, Partial<ErrorAnswer>] => [
    method,
    'columns of different lengths',
    { x: x.slice(1) },
    { code: 'wrong-length' },
  ]),
  ['gls-ar1', 'as many rows as coefficients', short, { code: 'too-few-observations' }],
  ['gls-ar1', 'an exact line', { y: onALine }, { code: 'exact-fit' }],
  ['gls-ar1', 'an exact line (prais-winsten)', { y: onALine, estimator: 'prais-winsten' }, { code: 'exact-fit' }],
  ['residual-tests', 'an exact line', { y: onALine }, { code: 'exact-fit' }],
  ['residual-tests', 'as many lags as rows', { lags: 24 }, { code: 'out-of-range', where: 'breuschGodfrey, lags' }],
  ['residual-tests', 'half a lag', { lags: 1.5 }, { code: 'input-form' }],
  [
    'residual-tests',
    'more fitted coefficients than lags',
    { fitdf: 3 },
    { code: 'out-of-range', where: 'ljungBox, fitdf' },
  ],
  ['theil-sen', 'two rows', short, { code: 'too-few-values' }],
  ['theil-sen', 'a constant predictor', { x: same(3) }, { code: 'constant', where: 'theilSen, x' }],
  ['theil-sen', 'nothing but ties', { y: same(3) }, { code: 'constant', where: 'theilSen, y' }],
  [
    'huber',
    'a line through half of the rows',
    { y: onALine.map((value, t) => value + (t % 5 === 0 ? 1 : 0)) },
    { code: 'zero-scale' },
  ],
  ['huber', 'k of zero', { k: 0 }, { code: 'out-of-range', where: 'huber, k' }],
  ['york', 'two rows', short, { code: 'too-few-values' }],
  ['york', 'a negative error', { sy: -0.1 }, { code: 'negative' }],
  ['york', 'no error at all', { sx: 0, sy: 0 }, { code: 'no-error' }],
  ['york', 'errors of another length', { sy: same(0.1, 5) }, { code: 'wrong-length' }],
  ['york', 'wholly correlated errors', { r: 1 }, { code: 'out-of-range' }],
  ['york', 'a constant predictor', { x: same(3) }, { kind: 'NumericError' }],
  ['adf', 'as many lags as rows', { lags: 24 }, { code: 'out-of-range', where: 'adf, lags' }],
  ['adf', 'a constant series', { y: same(3) }, { kind: 'NumericError' }],
  ['adf', 'another word', { deterministic: 'drift' }, { code: 'input-form', where: 'adf.deterministic' }],
  ...atOnce.flatMap((method): [Method, string, object, Partial<ErrorAnswer>][] => [
    [method, 'two rows', short, { code: 'too-few-values' }],
    [method, 'a constant predictor', { x: same(3) }, { code: 'constant' }],
    [method, 'nothing but ties', { y: same(3) }, { code: 'constant' }],
    [method, 'columns of different lengths', { x: x.slice(1) }, { code: 'wrong-length' }],
  ]),
  ['deming', 'errors of no ratio', { delta: 0 }, { code: 'out-of-range', where: 'deming, delta' }],
  ['attenuation', 'a negative error', { xErrorStandardDeviation: -0.1 }, { code: 'out-of-range' }],
  ['attenuation', 'errors as large as the spread', { xErrorStandardDeviation: 5 }, { code: 'no-signal' }],
  ['reset', 'a power of one', { powers: [1] }, { code: 'out-of-range' }],
  ['reset', 'fewer rows than coefficients', short, { code: 'too-few-observations' }],
  ['reset', 'an exact line', { y: onALine }, { code: 'exact-fit' }],
  ['chow', 'a break that leaves too few rows', { breakRow: 1 }, { code: 'out-of-range', where: 'chowTest, breakRow' }],
  ['chow', 'an exact line', { y: onALine }, { code: 'exact-fit' }],
  ['cusum', 'fewer rows than it needs', { x: [1, 2, 4], y: [1, 3, 2] }, { code: 'too-few-observations' }],
  ['cusum', 'an exact line', { y: onALine }, { code: 'exact-fit' }],
  ['cusum', 'another level', { levelPercent: 7 }, { code: 'input-form' }],
  ['leave-one-out', 'a coefficient that is not there', { place: 2 }, { code: 'out-of-range' }],
  ['leave-one-out', 'a weight of zero', { weights: x.map((_, t) => t) }, { code: 'not-positive' }],
  ['leave-one-out', 'fewer rows than coefficients', { x: [1], y: [2] }, { code: 'too-few-observations' }],
  ['phase-surrogates', 'a constant', { values: same(3) }, { code: 'constant' }],
  ['phase-surrogates', 'three values', { values: [1, 2, 4] }, { code: 'too-few-values' }],
  ['forcing', 'an unknown formula', { formula: 'ln' }, { code: 'input-form', where: 'forcing.formula' }],
  ['forcing', 'no CO2', { co2Ppm: 0 }, { code: 'not-positive', where: 'forcing, co2Ppm[0]' }],
  ['forcing', 'CO2 in ppb', { co2Ppm: 420_000 }, { code: 'suspected-unit', where: 'forcing, co2Ppm' }],
  ['forcing', 'methane in ppm', { ch4Ppb: 1.9 }, { code: 'suspected-unit', where: 'forcing, ch4Ppb' }],
  ['forcing', 'lists of different lengths', { ch4Ppb: [1850, 1860] }, { code: 'wrong-length' }],
  ['forcing', 'a gas without its reference', { n2oRefPpb: undefined }, { code: 'unpaired-gas' }],
  ['kpss', 'as many lags as rows', { lags: 24 }, { code: 'out-of-range', where: 'kpss, lags' }],
  ['kpss', 'a constant series', { y: same(3) }, { code: 'exact-fit' }],
];

it.each(bad)('compute %s refuses %s', async (method, _, change, expected) => {
  const { value, error } = await compute(method, { ...valid[method], ...change });
  expect(value).toBeUndefined();
  expect(error).toMatchObject(expected);
  expect(error?.expected).not.toBe('');
  expect(error?.received).not.toBe('');
});

it('compute theil-sen says by a caveat that a series is too short for an interval', async () => {
  const { value } = await compute('theil-sen', { x: [1, 2, 3], y: [1, 3, 2] });
  expect(value).toMatchObject({ confidence95: null });
  expect(JSON.stringify(value)).toContain('no-interval');
});
