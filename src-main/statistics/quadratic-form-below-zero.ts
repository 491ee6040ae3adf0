import { NumericError } from '../errors.ts';
import { finiteValues } from './finite-values.ts';

/** Relative change between two step sizes at which the integral stands. */
const AGREEMENT = 1e-12;
const MOST_HALVINGS = 8;

/**
 * Distribution of a quadratic form in normal variables at zero: P(Σ w_i z_i² < 0), z_i independent standard normal. Ratios
 * of quadratic forms come down to it.
 *
 * Model    with K(s) = −½ Σ log(1 − 2 s w_i), P = −(1/2πi) ∫ e^K(s)/s ds along Re s = c < 0, c where the integrand is
 *          smallest on the real axis; the same with the other sign and c > 0 for the upper tail, whichever is smaller. On
 *          this path the integrand falls off from its top without cancelling, so that a tiny p keeps its digits. The
 *          trapezoidal rule in v with Im s = sinh v/√K″ converges exponentially; its step is halved until p stands
 *
 * @param weights  [n ≥ 1] finite, of any sign
 * @returns  p to about a relative 1e-11; 0 or 1 when no weight is below, or above, zero
 * @throws   InputError not-finite; NumericError not-converged
 *
 * Source   Rice 1980, SIAM J. Sci. Stat. Comput. 1, 438–448; the integral is Imhof's (1961, Biometrika 48, 419–426)
 * Checked  test/reference/statistics/durbin-watson-test.test.ts (C: arctangents and F distributions, far into the tail; B:
 *          Imhof's integral by R's integrate)
 */
export function quadraticFormBelowZero(weights: ArrayLike<number>): number {
  const given = finiteValues('quadraticFormBelowZero', 'weights', weights);
  const largest = given.reduce((most, w) => Math.max(most, Math.abs(w)), 0);
  const w = given.filter((weight) => weight !== 0).map((weight) => weight / largest);
  if (!w.some((weight) => weight < 0)) return 0;
  if (!w.some((weight) => weight > 0)) return 1;
  const isBelowTail = w.reduce((total, weight) => total + weight, 0) > 0;
  const tail = tailBelow(isBelowTail ? w : w.map((weight) => -weight));
  return isBelowTail ? tail : 1 - tail;
}

/** P(Σ w z² < 0) where the mean Σ w is at least 0. */
function tailBelow(w: Float64Array): number {
  const c = saddle(w);
  const curvature = 1 / c ** 2 + w.reduce((total, weight) => total + 2 * (weight / (1 - 2 * c * weight)) ** 2, 0);
  const width = 1 / Math.sqrt(curvature);
  let step = 0.5;
  let before = trapezoid(w, c, width, step);
  for (let halving = 0; halving < MOST_HALVINGS; halving++) {
    step /= 2;
    const value = trapezoid(w, c, width, step);
    if (Math.abs(value - before) <= AGREEMENT * value) return value;
    before = value;
  }
  throw new NumericError({
    code: 'not-converged',
    where: 'quadraticFormBelowZero',
    expected: 'an integral that stands when its step is halved',
    received: `one that still moves near ${before.toPrecision(6)}`,
  });
}

/** Where K(s) − log |s| is smallest between the pole of the most negative weight and zero, by bisection on its slope. */
function saddle(w: Float64Array): number {
  let low = 0.5 / w.reduce((least, weight) => Math.min(least, weight), 0);
  let high = 0;
  for (;;) {
    const middle = (low + high) / 2;
    if (middle <= low || middle >= high) return high;
    const slope = w.reduce((total, weight) => total + weight / (1 - 2 * middle * weight), -1 / middle);
    if (slope < 0) low = middle;
    else high = middle;
  }
}

function trapezoid(w: Float64Array, c: number, width: number, step: number): number {
  // Everything over the integrand's height at the top, which alone may underflow.
  const top = logModulus(w, c);
  let total = 0.5;
  for (let node = 1; ; node++) {
    const v = node * step;
    const t = width * Math.sinh(v);
    let [logSize, phase] = [0, 0];
    for (const weight of w) {
      const [real, imaginary] = [1 - 2 * c * weight, -2 * t * weight];
      logSize -= 0.25 * Math.log(real * real + imaginary * imaginary);
      phase -= 0.5 * Math.atan2(imaginary, real);
    }
    const size = (Math.exp(logSize - top) * Math.cosh(v) * -c) / Math.hypot(c, t);
    // 1/(c + it), turned by −1.
    total += size * Math.cos(phase - Math.atan2(-t, -c));
    if (size < 1e-17) return (total * step * width * Math.exp(top)) / (Math.PI * -c);
  }
}

function logModulus(w: Float64Array, c: number): number {
  return w.reduce((total, weight) => total - 0.5 * Math.log(1 - 2 * c * weight), 0);
}
