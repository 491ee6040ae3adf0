const ROUNDING = 2 ** -54;

/**
 * φ_k(x): what is left of the exponential series behind its first k terms, over x^k. Repeated integrals of e^(rt) from 0 to
 * t are t^k φ_k(rt), and stay finite at r = 0.
 *
 * Model    φ_0 = e^x; φ_k(x) = Σ_n x^n/(n + k)! = [φ_(k−1)(x) − 1/(k − 1)!]/x
 *
 * @param k  0, 1 or 2
 * @param x  at most 0
 *
 * Source   Hochbruck & Ostermann 2010, Acta Numerica 19, 209–286, equation 2.10
 * Checked  test/unit/climate/two-layer/phi-functions.test.ts (C: exact rational sums of the series)
 */
export function phi(k: number, x: number): number {
  if (k === 0) return Math.exp(x);
  if (k === 1) return x === 0 ? 1 : Math.expm1(x) / x;
  if (x <= -1) return (phi(1, x) - 1) / x;
  let [term, sum] = [0.5, 0.5];
  for (let n = 1; Math.abs(term) > ROUNDING; n++) {
    term *= x / (n + 2);
    sum += term;
  }
  return sum;
}

/**
 * Divided difference [φ_k(high) − φ_k(low)]/(high − low), without the cancellation of that form: at equal arguments it is
 * the derivative.
 *
 * Model    by Leibniz's rule on φ_(k−1)(x) = x φ_k(x) + 1/(k − 1)!; near 0 as Σ_n h_(n−1)(low, high)/(n + k)!, h_m the sum
 *          of all products of m factors
 *
 * @param k          0, 1 or 2
 * @param low, high  low ≤ high ≤ 0
 *
 * Source   de Boor 2005, Surveys in Approximation Theory 1, 46–69 (Leibniz's rule; complete symmetric polynomials)
 * Checked  test/unit/climate/two-layer/phi-functions.test.ts (C: exact rational sums of the series)
 */
export function phiDifference(k: number, low: number, high: number): number {
  if (k === 0) {
    const gap = high - low;
    return Math.exp(high) * (gap === 0 ? 1 : -Math.expm1(-gap) / gap);
  }
  if (low <= -1) return (phi(k, high) - phiDifference(k - 1, low, high)) / -low;
  // |h_m| ≤ (m + 1)|low|^m: the terms alternate and fall, so what is left is less than the last.
  let [symmetric, power, factor] = [1, 1, k === 1 ? 1 / 2 : 1 / 6];
  let [term, sum] = [factor, factor];
  for (let n = 2; Math.abs(term) > ROUNDING; n++) {
    power *= high;
    symmetric = low * symmetric + power;
    factor /= n + k;
    term = symmetric * factor;
    sum += term;
  }
  return sum;
}
