import { fitLogRegression } from '../climate/procedures/fit-log-regression.ts';
import { covarianceWords } from '../climate/procedures/slope-estimates.ts';
import type { AssumptionOutcome, Weight } from '../contract/result.ts';
import { formatInterval, formatNumber, formatP } from '../quantities/notation.ts';
import { mean, sum, sumOfProducts } from '../statistics/summation.ts';
import { upperTailF } from '../statistics/upper-tail-f.ts';
import { outcome, type Assumption } from './assumption.ts';
import { fitCaveats, interval90, logClaimLine } from './claim-line.ts';
import { weightWords } from './weigh.ts';

/**
 * The line passes through (0, 0). The forced slope is b_0 = b_1 + a Σx/Σx², with a and b_1 of the line with a free
 * intercept on the same rows: the normal equations, exact.
 */
export const zeroIntercept: Assumption = {
  id: 'zero-intercept',
  group: 'The line',
  title: 'The line passes through zero',
  shortTitle: 'Line through zero',
  explanation:
    'At the anchor both the warming and the change of CO₂ are zero by definition, so the line is made to start there. If the anchor lies off the general run of the record, the slope tilts to make up for it.',
  method:
    'Fits the same rows with a free intercept. t of the intercept with Newey–West errors, partial F, the number with an intercept, and the mean residual of both lines by decade.',
  formula: 'y = a + b x against y = b x; slope through zero − slope with intercept = a · Σx / Σx²',
  needs: 'Nothing beyond the procedure.',
  source: 'Eisenhauer 2003, Teaching Statistics 25, 76–80 (from memory); Newey & West 1987, Econometrica 55, 703–708',

  applies: ({ procedure }) => procedure.kind === 'log-regression' && !procedure.intercept,

  test(context) {
    const { recomputation, show, showWithUnit, showShift } = context;
    const { rows, procedure, factor, fit, serialCovariance } = logClaimLine(context);
    const free = fitLogRegression(rows, { anchor: procedure.anchor, intercept: true, covariance: serialCovariance });
    const { regression } = free;
    const a = regression.coefficients[0] ?? NaN;
    const t = regression.t[0] ?? null;
    const p = regression.p[0] ?? null;
    const value = free.slope * factor;
    const effect = value - recomputation.value;
    const weight = context.weigh(value);
    const slopeInterval = interval90(value, free.slopeStandardError * Math.abs(factor), regression.degreesOfFreedom);
    const hidden = (-a * sum(rows.logRatio)) / sumOfProducts(rows.logRatio, rows.logRatio);
    const aText = formatNumber(a, { decimals: 3 });
    const side = a > 0 ? 'below' : 'above';
    return outcome('zero-intercept', {
      statistic:
        t === null
          ? null
          : {
              label: 'intercept t',
              value: t,
              p,
              interval: null,
              convention: `${covarianceWords(serialCovariance)}; t with ${regression.degreesOfFreedom} degrees of freedom; ${partialF(fit.regression.residuals, regression)}`,
            },
      test: `intercept ${aText} K${t === null ? '' : `, t = ${formatNumber(t, { decimals: 1 })}`}`,
      alternative: {
        value,
        interval: slopeInterval,
        quantity: recomputation.quantity,
        unit: recomputation.unit,
        label: 'with a free intercept',
      },
      effect,
      weight,
      reading: `The line that fits the record best starts at ${aText} K, so the anchor lies ${formatNumber(Math.abs(a), { decimals: 3 })} K ${side} it. Forced through the anchor, the slope makes up for that; set free, it changes by −a·Σx/Σx² = ${formatNumber(hidden, { decimals: 3, withSign: true })} K per e-folding, and the number from ${show(recomputation.value)} to ${showWithUnit(value)}${p === null ? '' : ` (intercept ${formatP(p)})`}.`,
      proposal: proposal(weight, p, showShift(effect)),
      sentence: `The number needs the line to pass exactly through its starting point. Without that requirement the same data give ${show(value)} (${formatInterval(slopeInterval)}, 5–95 %) instead of ${showWithUnit(recomputation.value)}: a change of ${showShift(effect)}, ${weightWords[weight]}.`,
      table: residualsByDecade(rows.years, fit.regression.residuals, regression.residuals),
      caveats: fitCaveats(regression),
    });
  },

  rung: ({ computation }) =>
    computation.procedure.kind === 'log-regression' && computation.procedure.intercept
      ? { reason: 'The procedure has a free intercept already.' }
      : {
          label: 'Line with a free intercept',
          change: (footing) => ({ ...footing, hasFreeIntercept: true }),
          caveats: [],
        },
};

/** The classical comparison of the two fits, in words. */
function partialF(forced: readonly number[], free: { residuals: number[]; degreesOfFreedom: number }): string {
  const freeSquares = sumOfProducts(free.residuals, free.residuals);
  if (freeSquares === 0) return 'no partial F: the line with an intercept fits exactly';
  const f = Math.max(0, ((sumOfProducts(forced, forced) - freeSquares) / freeSquares) * free.degreesOfFreedom);
  const p = upperTailF(f, 1, free.degreesOfFreedom);
  return `partial F (classical) = ${formatNumber(f, { decimals: 2 })} with 1 and ${free.degreesOfFreedom} degrees of freedom, ${formatP(p)}`;
}

function proposal(weight: Weight, p: number | null, effect: string): AssumptionOutcome['proposal'] {
  if (weight === 'negligible') {
    return { mark: 'met', reason: `A free intercept moves the number by ${effect} only, whatever its p-value.` };
  }
  if (p !== null && p >= 0.05) {
    return {
      mark: 'untested',
      reason: `A free intercept moves the number by ${effect}, but the record does not tell whether the intercept is zero (${formatP(p)}).`,
    };
  }
  return {
    mark: 'not met',
    reason: `A free intercept moves the number by ${effect}, and the record has an intercept that differs from zero${p === null ? '' : ` (${formatP(p)})`}.`,
  };
}

function residualsByDecade(years: readonly number[], forced: readonly number[], free: readonly number[]) {
  const rowsByDecade = Map.groupBy(years.keys(), (row) => Math.floor((years[row] ?? NaN) / 10) * 10);
  return {
    columns: ['Decade', 'Years', 'Mean residual, line through zero (K)', 'Mean residual, free intercept (K)'],
    rows: [...rowsByDecade].map(([decade, rows]) => [
      `${decade}s`,
      rows.length,
      mean(rows.map((row) => forced[row] ?? NaN)),
      mean(rows.map((row) => free[row] ?? NaN)),
    ]),
  };
}
