import type { EstimatorComparison, EstimatorEstimate } from '../../src-main/contract/estimator-comparison.ts';

const estimate = (
  id: EstimatorEstimate['id'],
  label: string,
  value: number,
  standardError: number | null,
  more: Partial<EstimatorEstimate> = {},
): EstimatorEstimate => ({
  id,
  label,
  value,
  standardError,
  interval95: { low: value - 2 * (standardError ?? 0.1), high: value + 2 * (standardError ?? 0.1), levelPercent: 95 },
  convention: `as ${id} has it`,
  parameters: [],
  order: 'not used',
  random: null,
  isOwn: false,
  caveats: [],
  ...more,
});

/** Every number here is made up. */
export const inventedComparison: EstimatorComparison = {
  quantity: 'apparent-sensitivity',
  unit: 'K per doubling',
  window: { start: 1960, end: 2019 },
  nObs: 58,
  stated: { value: 1.9, interval: { low: 1.85, high: 1.95 } },
  estimates: [
    estimate('ols-classical', 'Least squares, classical errors', 1.874, 0.041, { isOwn: true }),
    estimate('ols-newey-west', 'Least squares, Newey–West errors', 1.874, 0.068, {
      caveats: [{ code: 'gap-in-window', detail: 'No value in 1963: the years on either side count as neighbours.' }],
    }),
    estimate('gls-ar1-ml', 'AR(1) errors, maximum likelihood', 1.902, 0.092, {
      parameters: [
        { symbol: 'ρ', value: 0.52 },
        { symbol: 'σ', value: 0.093 },
      ],
    }),
    estimate('block-bootstrap', 'Least squares, block bootstrap', 1.88, 0.09, {
      random: { generator: 'invented', seed: 7, nDraws: 500 },
    }),
    estimate('theil-sen', 'Theil–Sen', 2.21, null, {
      caveats: [{ code: 'free-intercept', detail: 'This estimator always fits an intercept.' }],
    }),
  ],
  notComputed: [
    {
      ids: ['york', 'york-scaled'],
      labels: ['York, stated errors alone', 'York, errors scaled to the scatter'],
      reason: 'series tarn-ness-air: expected annual values with limits, but found a record without limits.',
    },
  ],
  gaps: {
    years: [1963, 1970],
    sentence: 'No value in 1963, 1970. Taking the years on either side for neighbours: Newey–West.',
  },
  residualTests: [
    {
      id: 'durbin-watson',
      label: 'Durbin–Watson',
      asks: 'neighbouring residuals are unrelated',
      statistic: 0.96,
      df: null,
      p: null,
      convention: 'Σ(e_t − e_(t−1))²/Σe_t²',
      caveats: [{ code: 'no-intercept', detail: 'Without an intercept the published bounds do not apply.' }],
    },
    {
      id: 'breusch-godfrey',
      label: 'Breusch–Godfrey',
      asks: 'residuals are unrelated to those of up to 3 lags before',
      statistic: 16.2,
      df: 3,
      p: 0.00103,
      convention: 'n R² of the residuals on the line’s own design; χ²',
      caveats: [],
    },
  ],
  testsMissing: null,
  caveats: [{ code: 'anchor-row', detail: 'The anchor year is itself a row at (0, 0).' }],
};
