import type { ComputeMethod } from '../../src-main/contract/compute.ts';

/** Invented: a line with a wiggle that carries over. */
const nRows = 24;
export const x = Array.from({ length: nRows }, (_, t) => t / 10);
export const y = x.map((value, t) => 0.4 + 1.7 * value + 0.2 * Math.sin(t * 0.9) + 0.05 * Math.cos(t * 2.3));
const wiggle = y.map((value, t) => value - 0.4 - 1.7 * x[t]!);
const years = x.map((_, t) => 1960 + t);
const line = { x, y, intercept: true };
const serial = { kind: 'newey-west', lag: 2, smallSample: true };

export interface StatisticsCase {
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

/** Every method of the statistics that can be asked for, in each of its kinds, and what bad input does to it. */
export const statisticsCases: Record<string, StatisticsCase> = {
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
    ['ml', 'reml', 'prais-winsten', 'cochrane-orcutt'].map((estimator): [string, StatisticsCase] => [
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
    ['residuals', 'pairs'].map((resample): [string, StatisticsCase] => [
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
