import { fitsLine } from '../contract/procedure.ts';
import { fittedLine } from '../climate/procedures/fitted-line.ts';
import { covarianceWords } from '../climate/procedures/slope-estimates.ts';
import type { AssumptionOutcome } from '../contract/result.ts';
import { NumericError } from '../errors.ts';
import { formatInterval, formatNumber, formatP } from '../quantities/notation.ts';
import { breuschGodfrey } from '../statistics/breusch-godfrey.ts';
import { designColumns } from '../statistics/design-columns.ts';
import { leastSquares } from '../statistics/least-squares.ts';
import { ljungBox } from '../statistics/ljung-box.ts';
import { praisWinsten } from '../statistics/prais-winsten.ts';
import { regression } from '../statistics/regression.ts';
import { outcome, untestable, type Assumption } from './assumption.ts';
import { interval90 } from './claim-line.ts';
import type { TestContext } from './test-context.ts';
import { heavier, weightWords } from './weigh.ts';

/**
 * Residuals are uncorrelated. Correlation hardly moves the number; it widens what is known about it. So two things are
 * weighed: where a line with AR(1) errors puts the number, and by how much the 90 % interval widens at each end.
 */
export const independentErrors: Assumption = {
  id: 'independent-errors',
  group: 'The errors',
  title: 'Neighbouring years are independent',
  shortTitle: 'Independent years',
  explanation:
    'A warm year is often followed by a warm year. Then a hundred years tell less than a hundred independent readings would, and an uncertainty worked out as if they were independent is too small.',
  method:
    'Durbin–Watson, Breusch–Godfrey and Ljung–Box tests on the residuals, their lag-one correlation and what it leaves of the sample size; Newey–West against classical errors; the line with AR(1) errors.',
  formula: 'n_eff = n (1 − r)/(1 + r); e_t = ρ e_(t−1) + u_t',
  needs: 'Nothing beyond the procedure.',
  source:
    'Durbin & Watson 1950; Breusch 1978 and Godfrey 1978; Ljung & Box 1978; Santer et al. 2000, J. Geophys. Res. 105, 7337; Newey & West 1987; Prais & Winsten 1954',

  applies: ({ procedure }) => fitsLine(procedure),

  test(context) {
    const { recomputation, show, showWithUnit, showShift } = context;
    const { fit, factor } = fittedLine(context);
    const { durbinWatson, lag1Autocorrelation: lagOne, effectiveSampleSize: nEffective, nObs } = fit.diagnostics;
    if (durbinWatson === null || lagOne === null || nEffective === null || nObs < 8) {
      return untestable(independentErrors, {
        reason:
          nObs < 8 ? `The record has ${nObs} years only.` : 'The line fits exactly: there are no errors to judge.',
        wouldNeed: 'Give a longer record, as it was measured.',
      });
    }
    const tests = serialTests(context);
    const { serialInterval, classicalInterval, ownInterval, errorRatio, serialWords } = intervals(context);
    const ar1 = ar1Number(context, factor);
    const value = ar1?.value ?? recomputation.value;
    const interval = ar1?.interval ?? serialInterval;
    const widening = halfWidth(serialInterval) - halfWidth(ownInterval);
    const weight = heavier(context.weigh(value), context.weighShift(widening));
    const effect = value - recomputation.value;
    const r = formatNumber(lagOne, { decimals: 2 });
    const dw = formatNumber(durbinWatson, { decimals: 2 });
    const n = formatNumber(nEffective, { decimals: 0 });
    const ratioText = formatNumber(errorRatio, { decimals: 1 });
    return outcome('independent-errors', {
      statistic: {
        label: 'Durbin–Watson',
        value: durbinWatson,
        p: null,
        interval: null,
        convention: `Σ(e_t − e_(t−1))²/Σe_t², about 2 for independent residuals, in order of year; Breusch–Godfrey over ${tests.lags} ${tests.lags === 1 ? 'lag' : 'lags'} ${formatP(tests.breuschGodfrey.p)}, Ljung–Box ${formatP(tests.ljungBox.p)}`,
      },
      test: `DW ${dw}; lag-one r ${r}; n_eff ${n} of ${nObs}; errors × ${ratioText}`,
      alternative: {
        value,
        interval,
        quantity: recomputation.quantity,
        unit: recomputation.unit,
        label: ar1 ? 'with AR(1) errors' : 'with Newey–West errors',
      },
      effect,
      weight,
      reading: `${likeness(lagOne)} (lag-one correlation ${r}, Durbin–Watson ${dw}): ${nObs} years say as much as about ${n} independent ones. Newey–West errors are ${ratioText} times the classical ones; the 5–95 % interval becomes ${formatInterval(serialInterval, recomputation.unit)} in place of ${formatInterval(classicalInterval)} under classical errors.${ar1 ? ` A line with AR(1) errors (ρ = ${formatNumber(ar1.rho, { decimals: 2 })}) moves the number by ${showShift(effect)}.` : ''}`,
      proposal: proposal(weight, tests.breuschGodfrey.p, showShift(effect), showShift(widening)),
      sentence: `The years are taken as independent. ${likeness(lagOne)} (lag-one correlation ${r}), so that ${nObs} years count for about ${n}. ${ar1 ? `Allowing for it gives ${showWithUnit(value)} (${formatInterval(interval)}, 5–95 %) instead of ${show(recomputation.value)}` : `Allowing for it leaves ${showWithUnit(value)} with ${formatInterval(interval)} (5–95 %)`}; the uncertainty is ${ratioText} times the classical one. This is ${weightWords[weight]}.`,
      table: {
        columns: ['Figure', 'Value', 'p'],
        rows: [
          ['Durbin–Watson', durbinWatson, null],
          [`Breusch–Godfrey, ${tests.lags} lags`, tests.breuschGodfrey.statistic, tests.breuschGodfrey.p],
          [`Ljung–Box, ${tests.lags} lags`, tests.ljungBox.statistic, tests.ljungBox.p],
          ['lag-one correlation, demeaned', lagOne, null],
          ['effective sample size', nEffective, null],
          [`standard error, Newey–West ÷ classical (${serialWords})`, errorRatio, null],
          ...(ar1 ? [['ρ of the AR(1) errors (Prais–Winsten)', ar1.rho, null]] : []),
        ],
      },
      caveats: recomputation.caveats.filter(({ code }) => code === 'gap-in-window'),
    });
  },
};

function serialTests(context: TestContext) {
  const { fit, intercept, serialCovariance } = fittedLine(context);
  const lags = Math.max(1, Math.min(serialCovariance.lag, fit.y.length - 4));
  const columns = designColumns('independent-errors', fit.x, fit.y.length, intercept);
  const line = leastSquares({ columns, y: fit.y, caller: 'independent-errors' });
  return { lags, breuschGodfrey: breuschGodfrey(line, lags), ljungBox: ljungBox(line.residuals, lags) };
}

/** 90 % intervals of the number: under Newey–West, under classical and under the procedure's own errors. */
function intervals(context: TestContext) {
  const { fit, intercept, factor, serialCovariance } = fittedLine(context);
  const place = intercept ? 1 : 0;
  const { value } = context.recomputation;
  const underErrors = (covariance: Parameters<typeof regression>[0]['covariance']) => {
    const answer = regression({ x: fit.x, y: fit.y, intercept, covariance });
    const standardError = (answer.standardErrors[place] ?? NaN) * Math.abs(factor);
    return { standardError, interval: interval90(value, standardError, answer.degreesOfFreedom) };
  };
  const serial = underErrors(serialCovariance);
  const classical = underErrors({ kind: 'classical' });
  const own = interval90(value, context.recomputation.standardError ?? NaN, fit.regression.degreesOfFreedom);
  return {
    serialInterval: serial.interval,
    classicalInterval: classical.interval,
    ownInterval: own,
    errorRatio: serial.standardError / classical.standardError,
    serialWords: covarianceWords(serialCovariance),
  };
}

/** null when the residuals leave no stationary AR(1) process to fit. */
function ar1Number(context: TestContext, factor: number) {
  const { fit, intercept } = fittedLine(context);
  try {
    const line = praisWinsten({ x: fit.x, y: fit.y, intercept });
    const place = intercept ? 1 : 0;
    const value = (line.coefficients[place] ?? NaN) * factor;
    const standardError = (line.standardErrors[place] ?? NaN) * Math.abs(factor);
    return { value, rho: line.rho, interval: interval90(value, standardError, line.degreesOfFreedom) };
  } catch (error) {
    if (error instanceof NumericError) return null;
    throw error;
  }
}

function halfWidth({ low, high }: { low: number | null; high: number | null }): number {
  return ((high ?? NaN) - (low ?? NaN)) / 2;
}

function likeness(lagOne: number): string {
  if (lagOne > 0.2) return 'Neighbouring residuals are alike';
  if (lagOne < -0.2) return 'Neighbouring residuals alternate';
  return 'Neighbouring residuals are nearly unrelated';
}

function proposal(
  weight: AssumptionOutcome['weight'],
  p: number,
  effect: string,
  widening: string,
): AssumptionOutcome['proposal'] {
  const consequence = `allowing for it moves the number by ${effect} and the half-width of its 5–95 % interval by ${widening}`;
  if (weight === 'negligible')
    return {
      mark: 'met',
      reason: `Whatever the tests say (Breusch–Godfrey ${formatP(p)}), ${consequence}: too little to matter.`,
    };
  if (p >= 0.05)
    return {
      mark: 'untested',
      reason: `The tests do not find correlation (Breusch–Godfrey ${formatP(p)}), yet ${consequence}.`,
    };
  return { mark: 'not met', reason: `The residuals are correlated (Breusch–Godfrey ${formatP(p)}); ${consequence}.` };
}
