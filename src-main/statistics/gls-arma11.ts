import type { Caveat } from '../contract/primitives.ts';
import { InputError, NumericError } from '../errors.ts';
import { arma11Filter } from './arma11-filter.ts';
import { arma11Likelihood } from './arma11-likelihood.ts';
import { designColumns } from './design-columns.ts';
import { refuseExactFit } from './exact-fit.ts';
import { finiteValues } from './finite-values.ts';
import { leastSquares, type LeastSquaresFit } from './least-squares.ts';
import { maximumInPlane, type Climb, type PlanePoint } from './maximum-in-plane.ts';
import { sumOfProducts } from './summation.ts';
import { yearSteps } from './year-steps.ts';

export interface GlsArma11Request {
  x: ArrayLike<number> | readonly ArrayLike<number>[];
  y: ArrayLike<number>;
  intercept: boolean;
  /** [nObs] whole, increasing: years without a row are then predicted across. Without them rows are consecutive. */
  years?: ArrayLike<number> | undefined;
}

export interface GlsArma11Fit {
  /** Intercept first when there is one. */
  coefficients: number[];
  standardErrors: number[];
  /** Of the error one step before. */
  phi: number;
  /** Of the innovation one step before. */
  theta: number;
  /** Standard deviation of the innovations u. */
  sigma: number;
  logLikelihood: number;
  caveats: Caveat[];
}

/**
 * φ = tanh a; θ goes beyond ±1, where the likelihood is that of 1/θ, so that θ = ±1 is a place like any other: it is
 * always level there. The only edge is φ = ±1, where the process has no stationary distribution.
 */
type Place = readonly [a: number, theta: number];
const BOUNDS = [8, 2] as const;
/** Starts of the search: φ from −0.998 to 0.998, θ from −0.98 to 0.98. */
const STARTS_A = Array.from({ length: 21 }, (_, i) => (i - 10) * 0.35);
const STARTS_THETA = Array.from({ length: 15 }, (_, j) => Math.sin(((j - 7) * Math.PI) / 16));
/** Half the 95 % point of χ² with 1 and 2 degrees of freedom: lower by less than this is not distinctly lower. */
const NEARLY_AS_HIGH = 1.92;
const HARDLY_HIGHER = 2.996;

/**
 * Generalised least squares with ARMA(1,1) errors, by the exact likelihood: the line, and its standard error, when errors
 * carry over for longer than their first correlation says, as those of a slow system observed with noise do.
 *
 * Model    y = Xb + e, e_t = φ e_{t−1} + u_t + θ u_{t−1}, |φ| < 1, |θ| ≤ 1, u normal with standard deviation σ, the
 *          first error from the stationary distribution; maximises the likelihood of all rows over b, σ, φ and θ. Every
 *          top reached from a grid of 315 starts is climbed on exact derivatives; the highest is taken
 * Assumes  rows in order of time; equally spaced unless `years` says where rows are missing
 *
 * @param x  [nObs], or columns; y [nObs]; finite
 * @returns  standardErrors from (X*′X*)⁻¹ RSS* /(n − k), * rows freed from φ and θ: they take φ and θ for known, so
 *           they are too small in short series; sigma √(RSS* /n).
 *           Caveats: no-maximum (the likelihood rises up to |φ| = 1; the figures are those at φ = ±0.9999998),
 *           near-unit-root, near-noninvertible, near-cancelling-roots, several-maxima
 * @throws   InputError and NumericError as `leastSquares`; InputError too-few-observations, unordered-years;
 *           NumericError exact-fit, not-converged
 *
 * Differs  θ has the sign of R's arima; Box & Jenkins write it with the other one. arima starts at one place and gives
 *          standard errors from the curvature in all parameters, with n in place of n − k
 * Source   Harvey & Phillips 1979, Biometrika 66, 49–58 (exact likelihood of a regression with ARMA errors); several
 *          maxima and |θ| = 1: Ansley & Newbold 1980, J. Econometrics 13, 159–183 (from memory)
 * Checked  test/reference/statistics/gls-arma11.test.ts (B: dense covariance matrices in base R; R's arima, also with
 *          missing years)
 */
export function glsArma11({ x, y, intercept, years }: GlsArma11Request): GlsArma11Fit {
  const response = finiteValues('glsArma11', 'y', y);
  const columns = designColumns('glsArma11', x, response.length, intercept);
  const steps = yearSteps('glsArma11', years, response.length);
  refuseTooFew(response.length, columns.length);
  const plain = leastSquares({ columns, y: response, caller: 'glsArma11' });
  refuseExactFit('glsArma11', plain.residualSumOfSquares, sumOfProducts(response, response));

  const climbs = climbsOf(surfaceOf(columns, response, steps));
  const best = climbs.reduce((highest, climb) => (climb.top.height > highest.top.height ? climb : highest));
  refuseUnsettled(best);
  const { height } = best.top;
  const [phi, theta] = valuesAt(best.top.at);
  const fit = fitAt(columns, response, steps, phi, theta);
  const n = response.length;
  const scale = fit.residualSumOfSquares / (n - columns.length);
  const others = climbs.filter((climb) => climb !== best && climb.top.height > height - NEARLY_AS_HIGH);
  return {
    coefficients: [...fit.coefficients],
    standardErrors: columns.map((_, j) => Math.sqrt(scale * fit.unscaledCovariance[j * (columns.length + 1)]!)),
    phi,
    theta,
    sigma: Math.sqrt(fit.residualSumOfSquares / n),
    logLikelihood: height,
    caveats: [
      ...edgeCaveats(phi, theta, best.end === 'top'),
      ...cancellingCaveats(height, plain),
      ...rivalCaveats(others.map(describe)),
    ],
  };

  function describe({ top, end }: Climb): string {
    const [otherPhi, otherTheta] = valuesAt(top.at);
    const other = fitAt(columns, response, steps, otherPhi, otherTheta).coefficients.at(-1)!;
    return `lower by ${(height - top.height).toFixed(2)} ${end === 'top' ? 'at a maximum' : 'and still rising'} at φ = ${otherPhi.toFixed(3)}, θ = ${otherTheta.toFixed(3)}, where the last coefficient is ${other.toPrecision(6)}`;
  }
}

function refuseTooFew(n: number, k: number): void {
  if (n >= k + 3) return;
  throw new InputError({
    code: 'too-few-observations',
    where: 'glsArma11',
    expected: `at least ${k + 3} rows for ${k} coefficients, φ, θ and σ`,
    received: `${n}`,
    hint: 'Take a longer window.',
  });
}

function valuesAt([a, theta]: Place): [phi: number, theta: number] {
  return [Math.tanh(a), Math.abs(theta) > 1 ? 1 / theta : theta];
}

function surfaceOf(columns: readonly Float64Array[], y: Float64Array, steps: Float64Array) {
  const likelihood = arma11Likelihood(columns, y, steps);
  return (at: Place): PlanePoint => {
    const phi = Math.tanh(at[0]);
    const { logLikelihood, slopePhi, slopeTheta } = likelihood(phi, at[1]);
    return { at, height: logLikelihood, slope: [slopePhi * (1 - phi) * (1 + phi), slopeTheta] };
  };
}

/** Different local maxima, and places where the likelihood still rises at the edge of φ. */
function climbsOf(surface: (at: Place) => PlanePoint): Climb[] {
  const grid = STARTS_A.map((a) => STARTS_THETA.map((theta) => surface([a, theta])));
  const isLow = (i: number, j: number) =>
    [-1, 0, 1].some((di) =>
      [-1, 0, 1].some((dj) => (grid[i + di]?.[j + dj]?.height ?? -Infinity) > grid[i]![j]!.height),
    );
  const climbs: Climb[] = [];
  grid.forEach((row, i) =>
    row.forEach((start, j) => {
      if (isLow(i, j)) return;
      const climb = maximumInPlane(surface, start, BOUNDS);
      if (!climbs.some(({ top }) => isSame(top.at, climb.top.at))) climbs.push(climb);
    }),
  );
  return climbs;
}

function isSame(one: Place, other: Place): boolean {
  const [phi, theta] = valuesAt(one);
  const [otherPhi, otherTheta] = valuesAt(other);
  return Math.abs(phi - otherPhi) < 1e-4 && Math.abs(theta - otherTheta) < 1e-4;
}

function fitAt(
  columns: readonly Float64Array[],
  y: Float64Array,
  steps: Float64Array,
  phi: number,
  theta: number,
): LeastSquaresFit {
  const { freed } = arma11Filter(phi, theta, steps);
  return leastSquares({ columns: columns.map(freed), y: freed(y), caller: 'glsArma11' });
}

function refuseUnsettled({ top, end }: Climb): void {
  if (end !== 'unsettled') return;
  const [phi, theta] = valuesAt(top.at);
  throw new NumericError({
    code: 'not-converged',
    where: 'glsArma11, phi and theta',
    expected: 'a highest likelihood that stands still',
    received: `one that still moves near φ = ${phi.toPrecision(4)}, θ = ${theta.toPrecision(4)}`,
    hint: 'Take AR(1) errors, or Newey–West errors, instead.',
  });
}

function rivalCaveats(rivals: readonly string[]): Caveat[] {
  if (rivals.length === 0) return [];
  return [{ code: 'several-maxima', detail: `Elsewhere the likelihood is nearly as high: ${rivals.join('; ')}.` }];
}

function edgeCaveats(phi: number, theta: number, isMaximum: boolean): Caveat[] {
  const caveats: Caveat[] = [];
  if (!isMaximum) {
    caveats.push({
      code: 'no-maximum',
      detail: `The likelihood still rises towards φ = ${phi > 0 ? 1 : -1}: it has no maximum for errors that return to the line, and these figures are not one. Fit the differences, or take the missing trend or step into the line.`,
    });
  } else if (Math.abs(phi) > 0.95) {
    caveats.push({
      code: 'near-unit-root',
      detail: `φ = ${phi.toFixed(3)} is close to a random walk: the standard errors are too small, and a test for a unit root is due.`,
    });
  }
  if (Math.abs(theta) > 0.95) {
    caveats.push({
      code: 'near-noninvertible',
      detail: `θ = ${theta.toFixed(3)} is close to ${theta > 0 ? 1 : -1}, where short series pile up whatever the true value: φ, θ and the standard errors are uncertain.`,
    });
  }
  return caveats;
}

/** At θ = −φ the process is white noise, whatever φ: if that is nearly as likely, φ and θ are not told apart. */
function cancellingCaveats(height: number, { nObs, residualSumOfSquares }: LeastSquaresFit): Caveat[] {
  const ofIndependent = -0.5 * nObs * (Math.log((2 * Math.PI * residualSumOfSquares) / nObs) + 1);
  if (height - ofIndependent > HARDLY_HIGHER) return [];
  return [
    {
      code: 'near-cancelling-roots',
      detail: `Independent errors are nearly as likely (log-likelihood lower by ${Math.max(0, height - ofIndependent).toFixed(2)}): φ and θ cancel, and neither is determined by itself.`,
    },
  ];
}
