import type { Caveat } from '../contract/primitives.ts';
import { InputError, NumericError } from '../errors.ts';
import { designColumns } from './design-columns.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';
import { leastSquares, type LeastSquaresFit } from './least-squares.ts';
import { quantileOfSorted } from './quantile.ts';
import { sum } from './summation.ts';

export interface HuberRequest {
  x: ArrayLike<number> | readonly ArrayLike<number>[];
  y: ArrayLike<number>;
  intercept: boolean;
  /** Residuals beyond k scales count only linearly; 1.345 keeps 95 % efficiency for normal errors. */
  k: number;
}

export interface HuberFit {
  /** Intercept first when there is one. */
  coefficients: number[];
  standardErrors: number[];
  scale: number;
  /** [nObs] 1 for rows that count in full, less for wild ones. */
  weights: number[];
  nIterations: number;
  caveats: Caveat[];
}

/** Median of |z| for a standard normal z, to the four digits that the literature uses. */
const NORMAL_MEDIAN_DEVIATION = 0.6745;
const STANDSTILL = 1e-12;
const MOST_ITERATIONS = 1000;

/**
 * Huber's robust regression: like least squares for ordinary residuals, but a wild one pulls no harder than k scales.
 *
 * Model    Σ ψ(e_i/s) x_i = 0 with ψ(u) = u for |u| ≤ k, k·sign u beyond; s = median |e|/0.6745 (about zero, not about
 *          the median), found anew in each step of iteratively reweighted least squares from the least-squares line
 * Assumes  independent errors, symmetric about the line; does not protect against wild x (leverage)
 *
 * @param x  [nObs], or columns; y [nObs]; finite
 * @param k  above 0, in scales
 * @returns  standardErrors by Huber's first formula: K² [Σψ²·s²/(n − p)]/m² (X′X)⁻¹, m the share of rows with |u| ≤ k,
 *           K = 1 + (p/n)(1 − m)/m. Caveat many-downweighted when more than a quarter of the rows count less than 1
 * @throws   InputError wrong-length, not-finite, out-of-range, too-few-observations; NumericError rank-deficient,
 *           zero-scale when half of the residuals are zero, not-converged
 *
 * Differs  MASS::rlm: same, but stops at 1e-4 and takes the variance in K with n − 1; statsmodels RLM: same with
 *          HuberT and cov "H1". Huber's "proposal 2" is another scale
 * Source   Huber 1981, Robust Statistics, §7.6 and §7.8 (section numbers from memory); Huber 1964, Ann. Math. Stat. 35, 73–101
 * Checked  test/reference/statistics/huber.test.ts (B: the same in base R; statsmodels' printed stackloss figures)
 */
export function huber({ x, y, intercept, k }: HuberRequest): HuberFit {
  finiteNumber('huber', 'k', k, { above: 0 });
  const response = finiteValues('huber', 'y', y);
  const columns = designColumns('huber', x, response.length, intercept);
  const n = response.length;
  const p = columns.length;
  if (n <= p) {
    throw new InputError({
      code: 'too-few-observations',
      where: 'huber',
      expected: `more than ${p} rows for ${p} coefficients`,
      received: `${n}`,
      hint: 'Take a longer window or fewer predictors.',
    });
  }
  const plain = leastSquares({ columns, y: response, caller: 'huber' });
  let fit = plain;
  for (let nIterations = 1; nIterations <= MOST_ITERATIONS; nIterations++) {
    const scale = medianDeviation(fit);
    const weights = fit.residuals.map((e) => Math.min(1, (k * scale) / Math.abs(e)));
    const next = leastSquares({ columns, y: response, weights, caller: 'huber' });
    const moved = next.fitted.reduce((most, value, i) => Math.max(most, Math.abs(value - fit.fitted[i]!)), 0);
    fit = next;
    if (moved <= STANDSTILL * scale) return answer(fit, plain, medianDeviation(fit), k, nIterations);
  }
  throw new NumericError({
    code: 'not-converged',
    where: 'huber, scale',
    expected: `a scale that stands still within ${MOST_ITERATIONS} iterations`,
    received: `one that still moves near ${medianDeviation(fit).toPrecision(4)}`,
    hint: 'Try another k: the median of the residuals may jump between two rows.',
  });
}

function medianDeviation({ residuals, y }: LeastSquaresFit): number {
  const scale = quantileOfSorted(residuals.map(Math.abs).sort(), 0.5) / NORMAL_MEDIAN_DEVIATION;
  const largest = y.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  if (scale > 8 * 2 ** -52 * largest) return scale;
  throw new NumericError({
    code: 'zero-scale',
    where: 'huber, scale',
    expected: 'a median residual above 0',
    received: 'a line that half of the rows lie on exactly',
    hint: 'Such data need no robust scale: look at the rows that are off the line.',
  });
}

function answer(fit: LeastSquaresFit, plain: LeastSquaresFit, scale: number, k: number, nIterations: number): HuberFit {
  const { nObs: n, nCoefficients: p } = fit;
  const scaled = fit.residuals.map((e) => e / scale);
  const inside = scaled.filter((u) => Math.abs(u) <= k).length / n;
  const psiSquares = sum(scaled.map((u) => Math.min(Math.abs(u), k) ** 2));
  const correction = 1 + ((p / n) * (1 - inside)) / inside;
  const factor = (correction * scale * Math.sqrt(psiSquares / (n - p))) / inside;
  const nDownweighted = Math.round((1 - inside) * n);
  return {
    coefficients: [...fit.coefficients],
    standardErrors: Array.from(fit.coefficients, (_, j) => factor * Math.sqrt(plain.unscaledCovariance[j * (p + 1)]!)),
    scale,
    weights: Array.from(scaled, (u) => Math.min(1, k / Math.abs(u))),
    nIterations,
    caveats:
      nDownweighted > n / 4
        ? [
            {
              code: 'many-downweighted',
              detail: `${nDownweighted} of ${n} rows lie beyond ${k} scales and count less.`,
            },
          ]
        : [],
  };
}
