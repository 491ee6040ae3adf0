/** Errors under AR(1), summed up: what the likelihood needs, for each distance between neighbouring rows. */
interface Sums {
  distance: number;
  n: number;
  now: number;
  before: number;
  nowNow: number;
  nowBefore: number;
  beforeBefore: number;
}

export interface Ar1AboutLevel {
  /** μ; 0 unless it is fitted. */
  level: number;
  rho: number;
  /** Standard deviation of the innovations, √(RSS* /n). */
  sigma: number;
  /** +∞ for errors without scatter. */
  logLikelihood: number;
}

/** Starts of the search over ρ, dense towards ±1. */
const STARTS = Array.from({ length: 41 }, (_, i) => Math.tanh((i - 20) / 5.5));
const GOLDEN = (Math.sqrt(5) - 1) / 2;
const NARROW = 1e-9;

/**
 * AR(1) errors about a level, by the exact likelihood: what a record's scatter about a curve says for that curve. The rows
 * are gone through once; each trial of ρ costs a few operations, so that a curve's parameters can be searched for.
 *
 * Model    e_t − μ = ρ(e_(t−1) − μ) + u_t, u normal of standard deviation σ, e_1 from the stationary distribution; across a
 *          gap of d years ρ^d and (1 − ρ^2d)/(1 − ρ²) take the place of ρ and 1. The likelihood at the best μ and σ,
 *          −n/2 (log 2πσ² + 1) + ½ log(1 − ρ²) − ½ Σ log F_t, at the ρ that makes it largest
 *
 * @param errors     [nObs ≥ 3] finite, in order of time; taken as checked
 * @param steps      [nObs] calendar distance of each row from the one before
 * @param hasLevel   μ is fitted; otherwise it is 0
 *
 * Differs  `glsAr1` fits any line, finds ρ to the last digit and refuses what it cannot settle; this is for many trials
 * Source   Beach & MacKinnon 1978, Econometrica 46, 51–58
 * Checked  test/reference/statistics/ar1-about-level.test.ts (B: R's arima, with and without gaps)
 */
export function ar1AboutLevel(errors: Float64Array, steps: Float64Array, hasLevel: boolean): Ar1AboutLevel {
  // Sums of squares about a value close to the level lose no digits to it.
  let shift = 0;
  if (hasLevel) {
    for (const value of errors) shift += value;
    shift /= errors.length;
  }
  const first = errors[0]! - shift;
  const sums = sumsByDistance(errors, steps, shift);
  const at = (rho: number) => likelihoodAt(rho, first, sums, errors.length, hasLevel);
  const trials = STARTS.map(at);
  const place = trials.reduce((top, trial, i) => (trial.logLikelihood > trials[top]!.logLikelihood ? i : top), 0);
  const best = goldenSection(at, STARTS[place - 1] ?? -1 + 1e-12, STARTS[place + 1] ?? 1 - 1e-12);
  return { ...best, level: best.level + shift };
}

function sumsByDistance(errors: Float64Array, steps: Float64Array, shift: number): Sums[] {
  const all: Sums[] = [];
  for (let t = 1; t < errors.length; t++) {
    const distance = steps[t]!;
    let sums = all.find((one) => one.distance === distance);
    if (!sums) {
      sums = { distance, n: 0, now: 0, before: 0, nowNow: 0, nowBefore: 0, beforeBefore: 0 };
      all.push(sums);
    }
    const now = errors[t]! - shift;
    const before = errors[t - 1]! - shift;
    sums.n++;
    sums.now += now;
    sums.before += before;
    sums.nowNow += now * now;
    sums.nowBefore += now * before;
    sums.beforeBefore += before * before;
  }
  return all;
}

function likelihoodAt(rho: number, first: number, sums: readonly Sums[], n: number, hasLevel: boolean): Ar1AboutLevel {
  const stationary = (1 - rho) * (1 + rho);
  // Σ (freed error)², its product with the freed ones, and Σ (freed one)².
  let [squares, products, ones] = [stationary * first * first, stationary * first, stationary];
  let gapHeight = 0;
  for (const { distance, n: count, now, before, nowNow, nowBefore, beforeBefore } of sums) {
    const carried = rho ** distance;
    const variance = distance === 1 ? 1 : (1 - carried * carried) / stationary;
    squares += (nowNow - 2 * carried * nowBefore + carried * carried * beforeBefore) / variance;
    products += ((1 - carried) * (now - carried * before)) / variance;
    ones += (count * (1 - carried) ** 2) / variance;
    gapHeight += 0.5 * count * Math.log(variance);
  }
  const level = hasLevel ? products / ones : 0;
  const variance = Math.max(0, squares - level * products) / n;
  const logLikelihood = -0.5 * n * (Math.log(2 * Math.PI * variance) + 1) + 0.5 * Math.log(stationary) - gapHeight;
  return { level, rho, sigma: Math.sqrt(variance), logLikelihood };
}

function goldenSection(at: (rho: number) => Ar1AboutLevel, low: number, high: number): Ar1AboutLevel {
  let [left, right] = [at(high - GOLDEN * (high - low)), at(low + GOLDEN * (high - low))];
  while (high - low > NARROW) {
    if (left.logLikelihood >= right.logLikelihood) {
      high = right.rho;
      right = left;
      left = at(high - GOLDEN * (high - low));
    } else {
      low = left.rho;
      left = right;
      right = at(low + GOLDEN * (high - low));
    }
  }
  return left.logLikelihood >= right.logLikelihood ? left : right;
}
