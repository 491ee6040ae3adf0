import type { Caveat } from '../contract/primitives.ts';
import { InputError, NumericError } from '../errors.ts';
import { ar1GapHeight } from './ar1-log-likelihood.ts';
import { ar1GapVariance, ar1Rows } from './ar1-rows.ts';
import { designColumns } from './design-columns.ts';
import { refuseExactFit } from './exact-fit.ts';
import { finiteValues } from './finite-values.ts';
import { leastSquares, type LeastSquaresFit } from './least-squares.ts';
import { sumOfProducts } from './summation.ts';
import { yearSteps } from './year-steps.ts';

export interface GlsAr1Request {
  x: ArrayLike<number> | readonly ArrayLike<number>[];
  y: ArrayLike<number>;
  intercept: boolean;
  estimator: 'ml' | 'reml';
  /** [nObs] whole, increasing: the calendar distance of the rows then counts. Without them rows are consecutive. */
  years?: ArrayLike<number> | undefined;
}

export interface GlsAr1Fit {
  /** Intercept first when there is one. */
  coefficients: number[];
  standardErrors: number[];
  /** Lag-one coefficient of the errors. */
  rho: number;
  /** Standard deviation of the innovations u. */
  sigma: number;
  logLikelihood: number;
  caveats: Caveat[];
}

interface Trial {
  rho: number;
  fit: LeastSquaresFit;
  variance: number;
  /** Derivative of the profile log-likelihood by ρ. */
  slope: number;
}

/** Starts of the search, dense towards ±1, where a likelihood can have a second maximum. */
const STARTS = Array.from({ length: 121 }, (_, i) => Math.tanh((i - 60) / 8));

/**
 * Generalised least squares with AR(1) errors, by the exact likelihood: the line, and its standard error, when each
 * error carries over a share ρ of the one before.
 *
 * Model    y = Xb + e, e_t = ρ e_{t−1} + u_t, u normal with standard deviation σ, e_1 from the stationary distribution.
 *          ml    maximises −n/2 log 2πσ² + ½ log(1 − ρ²) − ½ Σ log F_t − RSS*(b, ρ)/2σ², with σ² = RSS* /n
 *          reml  the same with n − k in place of n, less ½ log |X*′X*|, with σ² = RSS* /(n − k)
 *          where * marks rows freed from ρ as by `ar1Rows`, F_t is 1 but behind a gap. Every maximum over ρ is found as a zero of the exact derivative; the
 *          highest is taken
 * Assumes  rows in order of time; equally spaced unless `years` says where rows are missing
 *
 * @param x  [nObs], or columns; y [nObs]; finite
 * @returns  standardErrors from (X*′X*)⁻¹ RSS* /(n − k) for both estimators: they take ρ for known, so they are too
 *           small in short series; caveats several-maxima, near-unit-root
 * @throws   InputError and NumericError as `leastSquares`; InputError too-few-observations,
 *           unordered-years; NumericError not-stationary when the likelihood grows up to |ρ| = 1, exact-fit
 *
 * Differs  nlme::gls gives the marginal σ/√(1 − ρ²) as its sigma; R's arima divides by n for standard errors; the
 *          restricted likelihood of Harville 1974 has ½ log |X′X| more
 * Source   Beach & MacKinnon 1978, Econometrica 46, 51–58 (full likelihood); Patterson & Thompson 1971, Biometrika 58,
 *          545–554 (restricted)
 * Checked  test/reference/statistics/gls-ar1.test.ts (B: dense covariance matrices in base R; R's arima)
 */
export function glsAr1({ x, y, intercept, estimator, years }: GlsAr1Request): GlsAr1Fit {
  const response = finiteValues('glsAr1', 'y', y);
  const columns = designColumns('glsAr1', x, response.length, intercept);
  const n = response.length;
  const k = columns.length;
  if (n < k + 2) {
    throw new InputError({
      code: 'too-few-observations',
      where: 'glsAr1',
      expected: `at least ${k + 2} rows for ${k} coefficients, ρ and σ`,
      received: `${n}`,
      hint: 'Take a longer window.',
    });
  }
  const degrees = estimator === 'ml' ? n : n - k;
  const steps = yearSteps('glsAr1', years, n);
  const trial = (rho: number) => tryRho(columns, response, { rho, steps, estimator });

  const starts = STARTS.map(trial);
  const maxima: Trial[] = [];
  for (let i = 1; i < starts.length; i++) {
    if (starts[i - 1]!.slope > 0 && starts[i]!.slope <= 0) maxima.push(zeroOfSlope(starts[i - 1]!, starts[i]!, trial));
  }
  const logLikelihood = ({ rho, fit, variance }: Trial) =>
    -0.5 * degrees * (Math.log(2 * Math.PI * variance) + 1) +
    0.5 * Math.log((1 - rho) * (1 + rho)) -
    ar1GapHeight(rho, steps).height -
    (estimator === 'ml' ? 0 : 0.5 * fit.logDeterminant);
  const edges = [starts[0]!, starts.at(-1)!].filter(({ rho, slope }) => rho * slope > 0);
  const best = maxima.reduce<Trial | null>((a, b) => (a && logLikelihood(a) >= logLikelihood(b) ? a : b), null);
  if (!best || edges.some((edge) => logLikelihood(edge) > logLikelihood(best))) throw notStationary(edges);

  const scale = best.fit.residualSumOfSquares / (n - k);
  return {
    coefficients: [...best.fit.coefficients],
    standardErrors: columns.map((_, j) => Math.sqrt(scale * best.fit.unscaledCovariance[j * (k + 1)]!)),
    rho: best.rho,
    sigma: Math.sqrt(best.variance),
    logLikelihood: logLikelihood(best),
    caveats: caveatsOf(best, maxima.length + edges.length),
  };
}

function tryRho(
  columns: readonly Float64Array[],
  y: Float64Array,
  { rho, steps, estimator }: { rho: number; steps: Float64Array; estimator: 'ml' | 'reml' },
): Trial {
  const freed = (column: Float64Array) => ar1Rows(column, rho, steps);
  const fit = leastSquares({ columns: columns.map(freed), y: freed(y), caller: 'glsAr1' });
  const { nObs: n, nCoefficients: k, coefficients } = fit;
  const variance = fit.residualSumOfSquares / (estimator === 'ml' ? n : n - k);
  refuseExactFit('glsAr1', fit.residualSumOfSquares, sumOfProducts(fit.y, fit.y));
  const errors = y.map((value, t) => value - columns.reduce((fitted, c, j) => fitted + coefficients[j]! * c[t]!, 0));
  // ½ d RSS*/dρ at fixed b: by the envelope theorem b's own change does not count at the optimum.
  const halfRssSlope = sumOfProducts(fit.residuals, freedSlope(errors, fit.residuals, rho, steps));
  let slope = -rho / ((1 - rho) * (1 + rho)) - ar1GapHeight(rho, steps).slope - halfRssSlope / variance;
  if (estimator === 'reml') {
    // ½ d log|X*′X*|/dρ = trace[(X*′X*)⁻¹ X*′(dX*/dρ)]
    const slopes = columns.map((column, j) => freedSlope(column, fit.columns[j]!, rho, steps));
    for (let i = 0; i < k; i++) {
      for (let j = 0; j < k; j++)
        slope -= fit.unscaledCovariance[i * k + j]! * sumOfProducts(fit.columns[i]!, slopes[j]!);
    }
  }
  return { rho, fit, variance, slope };
}

/** Derivative by ρ of a column's freed rows. */
function freedSlope(column: Float64Array, freed: Float64Array, rho: number, steps: Float64Array): Float64Array {
  return column.map((value, t) => {
    if (t === 0) return (-rho * value) / Math.sqrt((1 - rho) * (1 + rho));
    const step = steps[t]!;
    if (step === 1) return -column[t - 1]!;
    const { variance, slope } = ar1GapVariance(rho, step);
    return (-step * rho ** (step - 1) * column[t - 1]!) / Math.sqrt(variance) - (0.5 * freed[t]! * slope) / variance;
  });
}

/** Bisection on the derivative: a maximum itself is flat, its derivative is not. */
function zeroOfSlope(left: Trial, right: Trial, trial: (rho: number) => Trial): Trial {
  let [low, high] = [left, right];
  for (;;) {
    const middle = (low.rho + high.rho) / 2;
    if (middle <= low.rho || middle >= high.rho) return high;
    const next = trial(middle);
    if (next.slope > 0) low = next;
    else high = next;
  }
}

function notStationary(edges: readonly Trial[]): NumericError {
  return new NumericError({
    code: 'not-stationary',
    where: 'glsAr1, rho',
    expected: 'a likelihood with its highest point at −1 < ρ < 1',
    received: `one that still grows at ${edges.map(({ rho }) => rho.toPrecision(6)).join(' and ')}`,
    hint: 'The errors wander like a random walk: fit the differences instead, or take the missing trend or step into the line.',
  });
}

function caveatsOf({ rho }: Trial, nMaxima: number): Caveat[] {
  const caveats: Caveat[] = [];
  if (nMaxima > 1) {
    caveats.push({
      code: 'several-maxima',
      detail: `The likelihood has ${nMaxima} maxima over ρ; the highest was taken.`,
    });
  }
  if (Math.abs(rho) > 0.95) {
    caveats.push({
      code: 'near-unit-root',
      detail: `ρ = ${rho.toFixed(3)} is close to a random walk: the standard errors are too small, and a test for a unit root is due.`,
    });
  }
  return caveats;
}
