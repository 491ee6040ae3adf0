import type { ClaimComputation } from '../../contract/compute.ts';
import type { EstimatorComparison, EstimatorEstimate, EstimatorId } from '../../contract/estimator-comparison.ts';
import type { Caveat } from '../../contract/primitives.ts';
import { errorSentence, isFootingError } from '../../errors.ts';
import { formatYearList } from '../../quantities/notation.ts';
import { statedInterval, statedValue } from '../../quantities/stated-number.ts';
import { fittedLine } from '../procedures/fitted-line.ts';
import { recompute } from '../procedures/recompute.ts';
import { ar1Estimators } from './ar1-estimators.ts';
import { arma11Estimators } from './arma11-estimators.ts';
import { bootstrapEstimators } from './bootstrap-estimators.ts';
import type { ComparedLine, Estimator } from './estimator.ts';
import { leastSquaresEstimators } from './least-squares-estimators.ts';
import { residualTestLines } from './residual-test-lines.ts';
import { robustEstimators } from './robust-estimators.ts';
import { yorkEstimators } from './york-estimators.ts';

/** In the order in which they are shown. */
const estimators: readonly Estimator[] = [
  ...leastSquaresEstimators,
  ...bootstrapEstimators,
  ...ar1Estimators,
  ...arma11Estimators,
  ...robustEstimators,
  ...yorkEstimators,
];

/**
 * The claim's number under every estimator, on the very rows of its recomputation and turned into its unit by the same
 * factor: how far does it hang on the way the line is fitted, and on the way its error is counted?
 *
 * Assumes  at most one row a year. Estimators that take the rows on either side of a gap for neighbours say so in a
 *          caveat; those by likelihood count the calendar
 *
 * @returns  one estimate for each estimator, or in `notComputed` the reason why it has none; tests of the residuals of
 *           the least-squares line
 * @throws   InputError `no-line` for a procedure without one; as `recompute`
 *
 * Checked   test/reference/climate/compare-estimators.test.ts (B: R on the real record)
 */
export function compareEstimators(
  computation: ClaimComputation,
  onProgress?: (shareDone: number) => void,
): EstimatorComparison {
  const recomputation = recompute(computation);
  const line: ComparedLine = { ...fittedLine({ computation, recomputation }), computation };
  const { fit } = line;
  const gapYears = fit.leftOut
    .map(({ year }) => year)
    .filter((year) => year > fit.window.start && year < fit.window.end);
  const gapCaveats = gapYears.length > 0 ? [gapCaveat(gapYears)] : [];

  const estimates: EstimatorEstimate[] = [];
  const refused: { id: EstimatorId; label: string; reason: string }[] = [];
  const asked = estimators.filter(({ applies }) => applies?.(line) ?? true);
  for (const [place, estimator] of asked.entries()) {
    const { id, label } = estimator;
    const estimate = orReason(() => estimateOf(estimator, line, gapCaveats));
    if (typeof estimate === 'string') refused.push({ id, label, reason: estimate });
    else estimates.push(estimate);
    onProgress?.((place + 1) / asked.length);
  }
  const tests = orReason(() => residualTestLines(line));
  const { value } = computation.statement;
  return {
    quantity: recomputation.quantity,
    unit: recomputation.unit,
    window: fit.window,
    nObs: fit.y.length,
    stated: { value: statedValue(value), interval: statedInterval(value) },
    estimates,
    notComputed: byReason(refused),
    gaps: { years: gapYears, sentence: gapSentence(gapYears, estimates) },
    residualTests:
      typeof tests === 'string' ? [] : tests.map((test) => ({ ...test, caveats: [...test.caveats, ...gapCaveats] })),
    testsMissing: typeof tests === 'string' ? tests : null,
    caveats: recomputation.caveats.filter(({ code }) => aboutRows.includes(code)),
  };
}

/** Of the recomputation's doubts, those that bear on every estimate. */
const aboutRows = ['unit-differs', 'incomplete-year-means', 'part-year', 'anchor-row'];

function estimateOf(
  { id, label, order, estimate }: Estimator,
  line: ComparedLine,
  gapCaveats: Caveat[],
): EstimatorEstimate {
  const { slope, standardError, interval95, convention, parameters = [], random = null, caveats = [] } = estimate(line);
  const { factor, procedure } = line;
  return {
    id,
    label,
    value: slope * factor,
    standardError: standardError === null ? null : standardError * factor,
    interval95: interval95 && { low: interval95.low * factor, high: interval95.high * factor, levelPercent: 95 },
    convention,
    parameters,
    order,
    random,
    isOwn: id === (procedure.covariance.kind === 'classical' ? 'ols-classical' : 'ols-newey-west'),
    caveats: order === 'rows' ? [...caveats, ...gapCaveats] : caveats,
  };
}

/** An estimator without an answer must not take the others with it. */
function orReason<Value>(compute: () => Value): Value | string {
  try {
    return compute();
  } catch (error) {
    if (isFootingError(error)) return errorSentence(error.fields);
    throw error;
  }
}

/** Estimators that one thing stands in the way of, together. */
function byReason(refused: { id: EstimatorId; label: string; reason: string }[]): EstimatorComparison['notComputed'] {
  return [...Map.groupBy(refused, ({ reason }) => reason)].map(([reason, all]) => ({
    ids: all.map(({ id }) => id),
    labels: all.map(({ label }) => label),
    reason,
  }));
}

function gapCaveat(years: number[]): Caveat {
  return {
    code: 'gap-in-window',
    detail: `No value in ${formatYearList(years)}: the years on either side count as neighbours.`,
  };
}

function gapSentence(years: number[], estimates: readonly EstimatorEstimate[]): string {
  if (years.length === 0) return 'Every year of the window has a value, so that rows are one year apart.';
  const labels = (order: EstimatorEstimate['order']) =>
    estimates.filter((estimate) => estimate.order === order).map(({ label }) => label);
  const closed = [...labels('rows'), 'the tests of the residuals'].join('; ');
  const calendar = labels('calendar');
  const counted = calendar.length > 0 ? ` The calendar distance is used by ${calendar.join('; ')}.` : '';
  return `No value in ${formatYearList(years)}. Taking the years on either side of a gap for neighbours, without the calendar distance: ${closed}.${counted} The other estimators do not look at the order of years.`;
}
