import { NumericError } from '../errors.ts';
import { multiplyByQ, multiplyByQTransposed, solveUpper, solveUpperTransposed, type PivotedQr } from './pivoted-qr.ts';
import { sumOfProducts } from './summation.ts';

const EPSILON = 2 ** -52;
/** More refinements than this are needed only where the answer cannot be trusted. */
const MOST_REFINEMENTS = 6;
/** Refinement has settled when a step moves less than this share of the coefficients or of y: ten digits stand. */
const STANDSTILL = 1e-10;
/** Below this share of y's length a residual, or a column's part in y, is what doubled precision leaves of a zero. */
const RESOLUTION = 2 ** -80;

/**
 * Least-squares coefficients b and residuals r to nearly all digits that the columns allow: solved together from
 * r + Xb = y and X′r = 0, then refined by what the solution leaves of both equations in doubled precision.
 *
 * Assumes  columns and y of length about 1
 *
 * @param caller  who asks, for error messages
 * @param design  nColumns × [nObs]
 * @param y       [nObs]
 * @param qr      decomposition of the design, of full rank
 * @throws   NumericError ill-conditioned when refinement does not settle
 *
 * Source   Björck 1967, BIT 7, 257–278
 * Checked  test/unit/statistics/refined-solution.test.ts, level C: exact solutions that one pass misses
 */
export function refinedSolution(
  caller: string,
  design: readonly Float64Array[],
  y: Float64Array,
  qr: PivotedQr,
): { solution: Float64Array; remainder: Float64Array } {
  const nColumns = design.length;
  const solution = new Float64Array(nColumns);
  const remainder = new Float64Array(y.length);
  const left = new Float64Array(nColumns + 2);
  const right = new Float64Array(nColumns + 2);
  let [step, size] = [Infinity, 0];

  for (let round = 0; round <= MOST_REFINEMENTS; round++) {
    // What the present solution leaves of both equations, in doubled precision: f = y − r − Xb, g = −X′r.
    const f = y.slice();
    const g = new Float64Array(nColumns);
    if (round > 0) {
      for (let i = 0; i < y.length; i++) {
        for (let j = 0; j < nColumns; j++) {
          left[j] = design[j]![i]!;
          right[j] = -solution[j]!;
        }
        left[nColumns] = y[i]!;
        right[nColumns] = 1;
        left[nColumns + 1] = remainder[i]!;
        right[nColumns + 1] = -1;
        f[i] = sumOfProducts(left, right);
      }
      for (let j = 0; j < nColumns; j++) g[j] = -sumOfProducts(design[qr.pivot[j]!]!, remainder);
    }
    multiplyByQTransposed(qr, f);
    const h = solveUpperTransposed(qr, g);
    const correction = solveUpper(
      qr,
      f.map((value, i) => (i < nColumns ? value - h[i]! : 0)),
    );
    f.set(h);
    multiplyByQ(qr, f);

    const lastStep = step;
    [step, size] = [0, 0];
    for (let j = 0; j < nColumns; j++) {
      const place = qr.pivot[j]!;
      solution[place]! += correction[j]!;
      step = Math.max(step, Math.abs(correction[j]!));
      size = Math.max(size, Math.abs(solution[place]!));
    }
    for (let i = 0; i < y.length; i++) remainder[i]! += f[i]!;
    if (round > 0 && (step <= 2 * EPSILON * size || step > lastStep / 2)) break;
  }
  // A coefficient that is zero but for rounding never stands still in proportion to itself: y's length, about 1, counts.
  if (step <= STANDSTILL * Math.max(size, 1)) {
    return { solution: solution.map(zeroBelowResolution), remainder: remainder.map(zeroBelowResolution) };
  }
  throw new NumericError({
    code: 'ill-conditioned',
    where: caller,
    expected: 'a solution that stands still under refinement',
    received: `columns so nearly dependent (pivot ratio ${qr.pivotRatio.toExponential(1)}) that it does not`,
    hint: 'Leave a column out, or centre and scale the predictors if they are powers of one variable.',
  });
}

function zeroBelowResolution(value: number): number {
  return Math.abs(value) < RESOLUTION ? 0 : value;
}
