import type { LogRegressionProcedure } from '../../contract/procedure.ts';
import type { ClaimComputation } from '../../contract/compute.ts';
import type { Caveat } from '../../contract/primitives.ts';
import type { Recomputation } from '../../contract/result.ts';
import { agreementWithStated } from '../../quantities/stated-number.ts';
import { alignForLogRegression } from './align-for-log-regression.ts';
import { anchorRows } from './anchor-rows.ts';
import { slopeConversion } from './slope-conversion.ts';
import { slopeEstimates } from './slope-estimates.ts';
import { unitCaveats } from './unit-caveats.ts';

/**
 * Apparent sensitivity from a log-regression: the slope of observed warming on the logarithm of CO2, turned into
 * kelvin per doubling.
 *
 * Model    y = [a +] b x + e, x = ln(C/C0), y = T − T0; b in K per e-folding; per doubling b ln 2
 * Assumes  annual means of series in their own units; C0 and T0 from the anchor years, taken as exact
 *
 * @returns  the number in the unit of the conversion, its error and 95 % interval under the procedure's covariance,
 *           agreement with the stated number, the fit, caveats
 * @throws   InputError as `alignForLogRegression` and `anchorRows`, `unit-mismatch` when the statement is in a unit of
 *           another kind; NumericError as `regression`
 *
 * Differs   b ln 2 is none of ECS, effective sensitivity or TCR: all warming is put on CO2, and heat uptake is left out
 * Checked   test/reference/climate/log-regression.test.ts (B: R's lm on the same join of real series)
 */
export function logRegression(computation: ClaimComputation, procedure: LogRegressionProcedure): Recomputation {
  const { statement } = computation;
  const { factor, unit, words } = slopeConversion(procedure.conversion, statement.unit);
  const annual = alignForLogRegression(computation, procedure);
  const { rows, anchorValues } = anchorRows(annual, procedure.anchor);
  const estimates = slopeEstimates(rows.logRatio, rows.warmingK, procedure);
  const [slope] = estimates.slopes;
  const value = slope.value * factor;
  const { low, high } = slope.interval95;
  return {
    quantity: 'apparent-sensitivity',
    unit,
    value,
    standardError: slope.standardError * factor,
    interval: { low: (low ?? NaN) * factor, high: (high ?? NaN) * factor, levelPercent: 95 },
    agreement: agreementWithStated(statement.value, value, { bound: statement.bound, unit }),
    fit: {
      window: annual.window,
      slopes: estimates.slopes,
      intercept: estimates.intercept,
      diagnostics: estimates.diagnostics,
      regression: estimates.regression,
      years: rows.years,
      x: rows.logRatio,
      y: rows.warmingK,
      xLabel: 'ln(C/C0)',
      yLabel: 'T − T0, K',
      aligned: rows,
      leftOut: annual.leftOut,
      anchorValues,
    },
    conversion: words(slope.value),
    working: [],
    caveats: [
      ...unitCaveats(unit, statement.unit),
      ...annual.caveats,
      ...anchorCaveats(procedure),
      ...estimates.caveats,
    ],
  };
}

function anchorCaveats({ anchor, intercept }: LogRegressionProcedure): Caveat[] {
  if (intercept || anchor.kind !== 'first-year') return [];
  return [
    {
      code: 'anchor-row',
      detail:
        'The anchor year is itself a row at (0, 0): a line forced through it learns nothing from that row, which still counts in n.',
    },
  ];
}
