import type { Caveat } from '../contract/primitives.ts';
import { NumericError } from '../errors.ts';
import { deviations } from './deviations.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';
import { mean, sum, sumOfProducts } from './summation.ts';

export interface DemingRequest {
  x: ArrayLike<number>;
  y: ArrayLike<number>;
  /** Variance of the errors of y over that of the errors of x, in (unit of y / unit of x)²; 1 gives the major axis. */
  delta: number;
}

export interface DemingFit {
  slope: number;
  intercept: number;
  /** By leaving out one row at a time. */
  slopeStandardError: number;
  interceptStandardError: number;
  caveats: Caveat[];
}

/** Second moments about the means, and the means. */
interface Moments {
  meanX: number;
  meanY: number;
  xx: number;
  xy: number;
  yy: number;
}

/**
 * Deming's line: the best line when both variables have errors of which only the ratio of variances is known. `york` is
 * for stated errors, row by row.
 *
 * Model    y_i = a + b x_i between true values, both observed with normal errors of constant variance;
 *          b = [s_yy − δ s_xx + √((s_yy − δ s_xx)² + 4δ s_xy²)]/(2 s_xy), a = ȳ − b x̄, δ = var(errors of y)/var(errors of x)
 * Assumes  rows independent of each other; no other scatter about the line than these errors
 *
 * @param x, y   [nObs ≥ 3] finite, neither constant
 * @param delta  above 0
 * @returns  standard errors by jackknife: √((n − 1)/n Σ (b_i − b̄)²), b_i without row i, b̄ their mean.
 *           Caveat few-rows below ten
 * @throws   InputError wrong-length, too-few-values, not-finite, out-of-range; NumericError constant, no-direction when x
 *           and y are uncorrelated and no direction is the long one
 *
 * Differs  the ratio is also defined upside down, var(x)/var(y). δ → ∞ is regression of y on x, δ → 0 of x on y;
 *          δ = s_yy/s_xx gives the geometric mean of both
 * Source   Deming 1943, Statistical Adjustment of Data; jackknife: Linnet 1990, Stat. Med. 9, 1463–1473
 * Checked  test/reference/statistics/deming.test.ts (A: Pearson 1901; B: base R, δ of ¼, 1 and 4)
 */
export function deming({ x: givenX, y: givenY, delta }: DemingRequest): DemingFit {
  finiteNumber('deming', 'delta', delta, { above: 0 });
  const dx = deviations('deming', 'x', givenX, { atLeast: 3 });
  const dy = deviations('deming', 'y', givenY, { length: dx.length });
  const x = finiteValues('deming', 'x', givenX);
  const y = finiteValues('deming', 'y', givenY);
  const n = dx.length;
  const all: Moments = {
    meanX: mean(x),
    meanY: mean(y),
    xx: sumOfProducts(dx, dx),
    xy: sumOfProducts(dx, dy),
    yy: sumOfProducts(dy, dy),
  };
  const { slope, intercept } = lineOf(all, delta);
  const share = n / (n - 1);
  const without = Array.from(dx, (_, i) => {
    const xx = all.xx - share * dx[i]! ** 2;
    // What is left of a sum that one row makes up is rounding.
    if (xx <= 1e-10 * all.xx) throw noDirection(`row ${i}, without which x does not vary`);
    return lineOf(
      {
        meanX: all.meanX - dx[i]! / (n - 1),
        meanY: all.meanY - dy[i]! / (n - 1),
        xx,
        xy: all.xy - share * dx[i]! * dy[i]!,
        yy: Math.max(0, all.yy - share * dy[i]! ** 2),
      },
      delta,
    );
  });
  const detail = `${n} rows are few for errors by leaving out one at a time.`;
  return {
    slope,
    intercept,
    slopeStandardError: jackknifeError(without.map((line) => line.slope)),
    interceptStandardError: jackknifeError(without.map((line) => line.intercept)),
    caveats: n < 10 ? [{ code: 'few-rows', detail }] : [],
  };
}

function lineOf({ meanX, meanY, xx, xy, yy }: Moments, delta: number): { slope: number; intercept: number } {
  const difference = yy - delta * xx;
  if (Math.abs(xy) <= 1e-14 * Math.sqrt(xx * yy) && difference >= 0) throw noDirection('two that do not');
  const root = Math.hypot(difference, 2 * Math.sqrt(delta) * xy);
  // Of the two forms of the same root, the one that adds instead of cancelling.
  const slope = difference > 0 ? (difference + root) / (2 * xy) : (2 * delta * xy) / (root - difference);
  return { slope, intercept: meanY - slope * meanX };
}

function noDirection(received: string): NumericError {
  return new NumericError({
    code: 'no-direction',
    where: 'deming, slope',
    expected: 'x and y that vary together, with and without each row',
    received,
    hint: 'The errors are as large as the spread of the data: no line can be told from them.',
  });
}

function jackknifeError(values: readonly number[]): number {
  const centre = mean(values);
  const n = values.length;
  return Math.sqrt(((n - 1) / n) * sum(values.map((value) => (value - centre) ** 2)));
}
