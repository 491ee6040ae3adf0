import type { Anchor, SlopeCovariance } from '../../contract/procedure.ts';
import type { AlignedRows, RegressionAnswer } from '../../contract/result.ts';
import { regression } from '../../statistics/regression.ts';
import { anchorRows, type AnchorValues, type AnnualRows } from './anchor-rows.ts';

export interface LogRegressionOptions {
  anchor: Anchor;
  intercept: boolean;
  covariance: SlopeCovariance;
}

export interface LogRegressionFit {
  /** b, K per e-folding of CO2. */
  slope: number;
  slopeStandardError: number;
  /** 95 %, from the t distribution. */
  slopeInterval95: { low: number; high: number };
  /** null without an intercept. */
  intercept: { value: number; standardError: number } | null;
  rows: AlignedRows;
  anchorValues: AnchorValues;
  regression: RegressionAnswer;
}

/**
 * Least-squares line of warming on the logarithm of CO2, from an anchor. Cheap: for trying other anchors, with and
 * without intercept, under other covariances.
 *
 * Model    T − T0 = a + b ln(C/C0) + e, a = 0 without intercept; b in K per e-folding, b ln 2 in K per doubling
 *
 * @throws  InputError as `anchorRows` and `regression`; NumericError when all CO2 values are the same
 *
 * Checked  test/reference/climate/log-regression.test.ts (B: R's lm on real series)
 */
export function fitLogRegression(
  annual: AnnualRows,
  { anchor, intercept, covariance }: LogRegressionOptions,
): LogRegressionFit {
  const { rows, anchorValues } = anchorRows(annual, anchor);
  const answer = regression({ x: rows.logRatio, y: rows.warmingK, intercept, covariance });
  const place = intercept ? 1 : 0;
  const [low, high] = answer.confidence95[place] ?? [NaN, NaN];
  return {
    slope: answer.coefficients[place] ?? NaN,
    slopeStandardError: answer.standardErrors[place] ?? NaN,
    slopeInterval95: { low, high },
    intercept: intercept
      ? { value: answer.coefficients[0] ?? NaN, standardError: answer.standardErrors[0] ?? NaN }
      : null,
    rows,
    anchorValues,
    regression: answer,
  };
}
