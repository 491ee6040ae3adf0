import type { ResidualTest } from '../../contract/estimator-comparison.ts';
import type { Caveat } from '../../contract/primitives.ts';
import { formatNumber } from '../../quantities/notation.ts';
import { residualTests } from '../../statistics/residual-tests.ts';
import type { FittedLine } from '../procedures/fitted-line.ts';

/**
 * The tests of a line's residuals as lines of a table, each with its convention in words.
 *
 * @throws  as `residualTests`
 *
 * Checked  test/unit/climate/estimators/compare-estimators.test.ts (C: the figures are those of `residualTests`)
 */
export function residualTestLines({ fit: { x, y }, intercept, serialCovariance }: FittedLine): ResidualTest[] {
  const nCoefficients = intercept ? 2 : 1;
  const lags = Math.max(1, Math.min(serialCovariance.lag, y.length - nCoefficients - 1));
  const tests = residualTests({ x, y, intercept, lags, breuschPaganKind: 'studentised' });
  const { durbinWatson, durbinWatsonTest: exact, breuschGodfrey, ljungBox, breuschPagan, jarqueBera, caveats } = tests;
  const lagWords = lags === 1 ? 'one lag' : `${lags} lags`;
  const bearing = (...codes: string[]) => caveats.filter(({ code }) => codes.includes(code));
  return [
    {
      id: 'durbin-watson',
      label: 'Durbin–Watson',
      asks: 'neighbouring residuals are unrelated (about 2; towards 0 when they are alike)',
      statistic: durbinWatson,
      df: null,
      p: exact?.p ?? null,
      convention: `Σ(e_t − e_(t−1))²/Σe_t², in order of year${exact ? boundsWords(exact.bounds5Percent, intercept) : ''}`,
      caveats: bearing('no-intercept', 'no-exact-p'),
    },
    {
      id: 'breusch-godfrey',
      label: 'Breusch–Godfrey',
      asks: `residuals are unrelated to those of up to ${lagWords} before`,
      ...breuschGodfrey,
      convention: `n R² of the residuals on the line’s own design and ${lagWords} of residuals, zero before the first; χ²`,
      caveats: bearing('lags-against-length'),
    },
    {
      id: 'ljung-box',
      label: 'Ljung–Box',
      asks: `the first ${lagWords} of autocorrelation are zero together`,
      ...ljungBox,
      convention: `n(n + 2) Σ r_j²/(n − j) over ${lagWords}, demeaned; χ²; made for raw series: Breusch–Godfrey knows the predictor`,
      caveats: bearing('lags-against-length'),
    },
    {
      id: 'breusch-pagan',
      label: 'Breusch–Pagan',
      asks: 'the errors are of one variance along the line',
      statistic: breuschPagan.statistic,
      df: breuschPagan.df,
      p: breuschPagan.p,
      convention: 'studentised (Koenker 1981): n R² of the squared residuals on a constant and the predictor; χ²',
      caveats: [],
    },
    {
      id: 'jarque-bera',
      label: 'Jarque–Bera',
      asks: 'the errors are normal, by skewness and kurtosis',
      statistic: jarqueBera.statistic,
      df: jarqueBera.df,
      p: jarqueBera.p,
      convention: `skewness ${formatNumber(jarqueBera.skewness, 2)}, kurtosis ${formatNumber(jarqueBera.kurtosis, 2)} (normal: 0 and 3), demeaned; χ²; takes errors as independent`,
      caveats: shortForNormality(y.length),
    },
  ];
}

function boundsWords({ lower, upper }: { lower: number; upper: number }, intercept: boolean): string {
  const line = intercept ? 'a line with an intercept' : 'a line through the origin';
  return `; p exact for these years, one-sided towards likeness; 5 % bounds for ${line} ${formatNumber(lower, 2)} and ${formatNumber(upper, 2)}`;
}

/** In short series the statistic has longer tails than χ² (Jarque & Bera 1987); a hundred rows: common practice. */
function shortForNormality(nObs: number): Caveat[] {
  if (nObs >= 100) return [];
  return [
    {
      code: 'short-for-normality',
      detail: `${nObs} rows are few for the χ² distribution of this test: p is a rough guide.`,
    },
  ];
}
