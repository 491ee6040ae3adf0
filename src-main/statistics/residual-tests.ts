import type { Caveat } from '../contract/primitives.ts';
import type { ResidualTestsInput, ResidualTestsValue } from '../contract/series-tests.ts';
import { breuschGodfrey } from './breusch-godfrey.ts';
import { breuschPagan } from './breusch-pagan.ts';
import { designColumns } from './design-columns.ts';
import { durbinWatsonTest } from './durbin-watson-test.ts';
import { durbinWatson } from './durbin-watson.ts';
import { effectiveSampleSize } from './effective-sample-size.ts';
import { refuseExactFit } from './exact-fit.ts';
import { jarqueBera } from './jarque-bera.ts';
import { lagOneAutocorrelation } from './lag-one-autocorrelation.ts';
import { leastSquares } from './least-squares.ts';
import { ljungBox } from './ljung-box.ts';
import { sumOfProducts } from './summation.ts';
import { gapsClosedUp } from './year-steps.ts';

/** The exact distribution takes the eigenvalues of a matrix of this size: a second or so. */
const MOST_ROWS_FOR_EXACT_P = 400;

const noExactP: Caveat = {
  code: 'no-exact-p',
  detail: `The exact p of Durbin–Watson is worked out up to ${MOST_ROWS_FOR_EXACT_P} rows: beyond, Breusch–Godfrey decides.`,
};

/**
 * What the residuals of a least-squares line say about its errors: are they correlated in time, of one variance, normal?
 *
 * Model    the fit of y on x by least squares; each test as its own function says
 * Assumes  rows in order of time, equally spaced, without gaps
 *
 * @param x      [nObs], or columns; y [nObs]; finite
 * @param lags   how far back Breusch–Godfrey and Ljung–Box look, 1 … n − k − 1
 * @param fitdf  fitted ARMA coefficients; 0 unless given
 * @param breuschPaganKind  studentised unless given
 * @returns  durbinWatsonTest null beyond 400 rows, with a caveat; caveats no-intercept, no-exact-p, lags-against-length,
 *           gaps-closed-up
 * @throws   InputError and NumericError as `leastSquares`; NumericError exact-fit; InputError out-of-range
 *
 * Checked  test/reference/statistics/residual-tests.test.ts (B: base R)
 */
export function residualTests(input: ResidualTestsInput): ResidualTestsValue {
  const { x, y, intercept, lags, fitdf = 0, breuschPaganKind: kind = 'studentised', years } = input;
  const columns = designColumns('residualTests', x, y.length, intercept);
  const fit = leastSquares({ columns, y, caller: 'residualTests' });
  refuseExactFit('residualTests', fit.residualSumOfSquares, sumOfProducts(fit.y, fit.y));
  const { residuals } = fit;
  const lag1 = lagOneAutocorrelation(residuals);
  const exact = fit.nObs <= MOST_ROWS_FOR_EXACT_P ? durbinWatsonTest(fit, intercept) : null;
  const figures = 'Lag-one correlation, Durbin–Watson, Breusch–Godfrey and Ljung–Box';
  const closedUp = gapsClosedUp('residualTests', years, fit.nObs, figures);
  return {
    lag1,
    nEff: effectiveSampleSize(fit.nObs, lag1),
    durbinWatson: durbinWatson(residuals),
    durbinWatsonTest: exact && { p: exact.p, bounds5Percent: exact.bounds5Percent },
    breuschGodfrey: breuschGodfrey(fit, lags),
    ljungBox: ljungBox(residuals, lags, fitdf),
    jarqueBera: jarqueBera(residuals),
    breuschPagan: { ...breuschPagan(fit, intercept, kind), kind },
    caveats: [...(exact ? exact.caveats : [noExactP]), ...lagCaveats(fit.nObs, lags), ...closedUp],
  };
}

function lagCaveats(nObs: number, lags: number): Caveat[] {
  // Common practice: at most a fifth of the rows.
  if (lags <= nObs / 5) return [];
  return [
    {
      code: 'lags-against-length',
      detail: `${lags} lags are many for ${nObs} rows: the χ² distribution of the tests is then a rough guide.`,
    },
  ];
}
