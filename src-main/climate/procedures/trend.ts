import type { ClaimComputation } from '../../contract/compute.ts';
import type { TrendProcedure } from '../../contract/procedure.ts';
import type { Recomputation } from '../../contract/result.ts';
import { InputError } from '../../errors.ts';
import { checkUnit } from '../../quantities/check-unit.ts';
import { formatNumber, formatQuantity } from '../../quantities/notation.ts';
import { agreementWithStated } from '../../quantities/stated-number.ts';
import { alignWindow } from './align-window.ts';
import { seriesOf } from './series-of.ts';
import { slopeEstimates } from './slope-estimates.ts';
import { unitCaveats } from './unit-caveats.ts';

/**
 * Temperature trend: the slope of a least-squares line through annual values against the calendar year.
 *
 * Model    T = a + b t + e, t in years from the middle of the window; b in K per year, 10 b in K per decade
 *
 * @returns  as {@link Recomputation}; x of the fit counts years from the middle of the window
 * @throws   InputError as `alignWindow` and `checkUnit`, `unit-mismatch` when the statement is not a trend; NumericError
 *           as `regression`
 *
 * Checked   test/reference/climate/trend.test.ts (B: R's lm on a real series)
 */
export function trend(computation: ClaimComputation, procedure: TrendProcedure): Recomputation {
  const { statement } = computation;
  if (statement.unit !== 'K per decade' && statement.unit !== 'K per year') {
    throw new InputError({
      code: 'unit-mismatch',
      where: 'procedure trend',
      expected: 'a statement in K per decade or K per year',
      received: `a statement in ${statement.unit === '1' ? 'a plain number' : statement.unit}`,
      hint: 'Correct the unit of the statement, or choose another procedure.',
    });
  }
  const series = seriesOf(computation, 'seriesId', 'the series whose trend is taken');
  const kPerUnit = checkUnit(series, 'K');
  const { window, years, columns, leftOut, caveats } = alignWindow([series], procedure.minMonths, procedure.window);
  const temperatureK = (columns[0] ?? []).map((value) => value * kPerUnit);
  // Years from the middle: the intercept is then the value there, and no digits are lost to large year numbers.
  const middle = (window.start + window.end) / 2;
  const estimates = slopeEstimates(
    years.map((year) => year - middle),
    temperatureK,
    { intercept: true, covariance: procedure.covariance },
  );
  const [slope] = estimates.slopes;
  const factor = procedure.per === 'decade' ? 10 : 1;
  const unit = procedure.per === 'decade' ? 'K per decade' : 'K per year';
  const value = slope.value * factor;
  const { low, high } = slope.interval95;
  return {
    quantity: 'trend',
    unit,
    value,
    standardError: slope.standardError * factor,
    interval: { low: (low ?? NaN) * factor, high: (high ?? NaN) * factor, levelPercent: 95 },
    agreement: agreementWithStated(statement.value, value, { bound: statement.bound, unit }),
    fit: {
      window,
      slopes: estimates.slopes,
      intercept: estimates.intercept,
      diagnostics: estimates.diagnostics,
      regression: estimates.regression,
      years,
      x: years.map((year) => year - middle),
      y: temperatureK,
      xLabel: `year − ${middle}`,
      yLabel: `${series.name}, K`,
      aligned: null,
      leftOut,
      anchorValues: null,
    },
    conversion:
      factor === 10
        ? `${formatNumber(slope.value, { significantDigits: 4 })} K per year × 10 = ${formatQuantity(value, unit, { significantDigits: 4 })}`
        : null,
    working: [],
    caveats: [...unitCaveats(unit, statement.unit), ...caveats, ...estimates.caveats],
  };
}
