import { fitLogRegression } from '../climate/procedures/fit-log-regression.ts';
import type { AlignedRows } from '../contract/result.ts';
import { formatNumber, formatYear, formatYears } from '../quantities/notation.ts';
import { spreadOf } from '../robustness/window-sweep.ts';
import { lagOneAutocorrelation } from '../statistics/lag-one-autocorrelation.ts';
import { quantile } from '../statistics/quantile.ts';
import { sum, sumOfProducts } from '../statistics/summation.ts';
import { outcome, untestable, type Assumption } from './assumption.ts';
import { logClaimLine } from './claim-line.ts';
import { heavier, weightWords } from './weigh.ts';

/** Means of the record's first years that are tried beside its single years. */
const longAnchors = [10, 20, 30] as const;

/**
 * C0 and T0 are exact. Two answers: the number from every other year as anchor, and the standard error that an ordinary
 * year's departure from the line gives the number by way of the anchor alone: e0 at the anchor shifts the slope by
 * −e0 Σx/Σx².
 */
export const anchorYear: Assumption = {
  id: 'anchor-year',
  group: 'The line',
  title: 'The starting point of the line is exact',
  shortTitle: 'Exact starting point',
  explanation:
    'Everything is counted from the anchor. A year that is warm or cold by chance shifts all the others against it, and a line that must pass through it passes the error on to the slope.',
  method:
    'Takes every year of the record in turn as the anchor, and the means of its first 10, 20 and 30 years; and, by the formula, what an ordinary year’s departure from the line does to the slope.',
  formula: 'shift of b from an error e0 at the anchor: −e0 · Σx / Σx²',
  needs: 'Nothing beyond the procedure.',
  source: 'From the normal equation of the line through the origin; year-to-year noise as AR(1)',

  applies: ({ procedure }) => procedure.kind === 'log-regression' && !procedure.intercept,

  test(context) {
    const { recomputation, show, showWithUnit, showShift } = context;
    const { rows, procedure, factor } = logClaimLine(context);
    const { years } = rows;
    if (years.length < 5) {
      return untestable(anchorYear, {
        reason: `The record has ${years.length} years only.`,
        wouldNeed: 'Give series that share at least five years.',
      });
    }
    const isFirstYear = procedure.anchor.kind === 'first-year';
    const numbers = slopesFromEachYear(rows).map((slope) => slope * factor);
    const others = isFirstYear ? numbers.slice(1) : numbers;
    const { min, q05, q50, q95, max } = spreadOf(others);
    const typicalShift = quantile(
      others.map((number) => Math.abs(number - recomputation.value)),
      0.5,
    );
    const weight = heavier(context.weigh(q50), context.weighShift(typicalShift));
    const noise = anchorNoise(context);
    const means = longAnchors
      .filter((nYears) => nYears < years.length)
      .map((nYears) => ({
        label: `mean of ${formatYears({ start: years[0] ?? NaN, end: years[nYears - 1] ?? NaN })}`,
        number: meanAnchored(rows, nYears) * factor,
      }));
    const meansText = means.map(({ label, number }) => `${show(number)} from the ${label}`).join(', ');
    return outcome('anchor-year', {
      statistic: {
        label: 'standard error of the number from the anchor alone',
        value: noise.standardError,
        p: null,
        interval: null,
        convention: `${recomputation.unit}; Σx/Σx² times the standard deviation of the anchor’s temperature, ${formatNumber(noise.anchorSd, { decimals: 3 })} K: residuals about the line with a free intercept (${formatNumber(noise.yearSd, { decimals: 3 })} K), AR(1) with lag-one correlation ${formatNumber(noise.lagOne, { decimals: 2 })}, averaged over ${noise.nAnchor} ${noise.nAnchor === 1 ? 'year' : 'years'}`,
      },
      test: `${show(min)} to ${show(max)} over ${others.length} other anchor years; s.e. from the anchor ${show(noise.standardError)}`,
      alternative: {
        value: q50,
        interval: { low: q05, high: q95, levelPercent: 90 },
        quantity: recomputation.quantity,
        unit: recomputation.unit,
        label: 'median over all other anchor years',
      },
      effect: q50 - recomputation.value,
      weight,
      reading: `Anchored on any other year of the record the number lies between ${show(min)} and ${showWithUnit(max)}, with ${show(q50)} in the middle; half of the other years move it by more than ${show(typicalShift)}.${meansText ? ` It is ${meansText}.` : ''} The year-to-year scatter alone gives the number a standard error of ${show(noise.standardError)} by way of the anchor.`,
      proposal:
        weight === 'negligible'
          ? {
              mark: 'met',
              reason: `Half of the other anchor years move the number by less than ${show(typicalShift)}.`,
            }
          : {
              mark: 'not met',
              reason: `Half of the other anchor years move the number by more than ${show(typicalShift)}; the middle of them is ${showShift(q50 - recomputation.value)} away.`,
            },
      sentence: `The number needs the starting point of the line to be exact. From other years of the same record as the starting point it ranges from ${show(min)} to ${showWithUnit(max)} (median ${show(q50)}, stated procedure ${show(recomputation.value)}), which is ${weightWords[weight]}.`,
      table: {
        columns: ['Anchor', `Number (${recomputation.unit})`, 'Shift'],
        rows: [
          ...means.map(({ label, number }) => [label, number, number - recomputation.value]),
          ...numbers.map((number, row) => [formatYear(years[row] ?? NaN), number, number - recomputation.value]),
        ],
      },
    });
  },
};

/** Slopes of the lines through each year's own point, over all rows. */
function slopesFromEachYear({ logRatio, warmingK }: AlignedRows): number[] {
  return logRatio.map((x0, anchor) => {
    const y0 = warmingK[anchor] ?? NaN;
    const dx = logRatio.map((x) => x - x0);
    const dy = warmingK.map((y) => y - y0);
    return sumOfProducts(dx, dy) / sumOfProducts(dx, dx);
  });
}

function meanAnchored(rows: AlignedRows, nYears: number): number {
  const anchor = { kind: 'mean-of-first', years: nYears } as const;
  return fitLogRegression(rows, { anchor, intercept: false, covariance: { kind: 'classical' } }).slope;
}

/** What the scatter of single years does to the number by way of the anchor. */
function anchorNoise(context: Parameters<Assumption['test']>[0]) {
  const { rows, procedure, factor } = logClaimLine(context);
  const nAnchor = procedure.anchor.kind === 'first-year' ? 1 : procedure.anchor.years;
  const { regression } = fitLogRegression(rows, {
    anchor: procedure.anchor,
    intercept: true,
    covariance: { kind: 'classical' },
  });
  const yearSd = regression.residualStandardDeviation;
  const lagOne = regression.durbinWatson === null ? 0 : Math.max(0, lagOneAutocorrelation(regression.residuals));
  const anchorSd = yearSd * Math.sqrt(meanVarianceShare(nAnchor, lagOne));
  const perKelvin = sum(rows.logRatio) / sumOfProducts(rows.logRatio, rows.logRatio);
  return { nAnchor, yearSd, lagOne, anchorSd, standardError: Math.abs(anchorSd * perKelvin * factor) };
}

/** Variance of the mean of n values of an AR(1) process, as a share of that of one: (1/n)[1 + 2 Σ (1 − j/n) r^j]. */
function meanVarianceShare(n: number, r: number): number {
  let total = 1;
  for (let j = 1; j < n; j++) total += 2 * (1 - j / n) * r ** j;
  return total / n;
}
