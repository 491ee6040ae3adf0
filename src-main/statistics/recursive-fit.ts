import { finiteValues } from './finite-values.ts';

export interface RecursiveFit {
  /** Rows, counted from 0, before which every coefficient was determined: all but the first k, unless those repeat. */
  rows: number[];
  /** For each of `rows`: by how far the prediction from the rows before missed, brought to one variance. */
  residuals: Float64Array;
  /** For each of `rows`: all coefficients from the rows up to and with this one. */
  coefficients: Float64Array[];
}

/** What a row adds beyond the rows before is rounding below this share of its size. */
const ROUNDING_SHARE = 1e-11;

/**
 * Least squares row by row: the coefficients as each row comes in, and the recursive residuals, which are independent of
 * each other when the errors are.
 *
 * Model    w_t = (y_t − x_t′b_{t−1})/√(1 + x_t′(X′X)⁻¹x_t), X and b of the rows before t; Σw² = RSS when there are n − k.
 *          Rows enter the triangle R of X = QR by plane rotations; what is left of y_t is then w_t itself
 *
 * @param columns  [k × nObs] finite; y [nObs] finite, in order of time
 * @throws   InputError wrong-length, not-finite
 *
 * Source   Brown, Durbin & Evans 1975, J. R. Stat. Soc. B 37, 149–192; rotations: Golub & Van Loan 2013, §6.5.3 (number
 *          from memory)
 * Checked  test/reference/statistics/specification-tests.test.ts (B: R's lm on each row's past)
 */
export function recursiveFit(
  caller: string,
  columns: readonly Float64Array[],
  givenY: ArrayLike<number>,
): RecursiveFit {
  const y = finiteValues(caller, 'y', givenY, { length: columns[0]?.length ?? 0 });
  const k = columns.length;
  const triangle = columns.map(() => new Float64Array(k + 1));
  const isFilled = columns.map(() => false);
  const sizes = columns.map((column) => column.reduce((most, value) => Math.max(most, Math.abs(value)), 0));
  const fit: RecursiveFit = { rows: [], residuals: new Float64Array(y.length), coefficients: [] };
  for (let t = 0; t < y.length; t++) {
    const row = Float64Array.from([...columns.map((column) => column[t]!), y[t]!]);
    let isTaken = false;
    for (let j = 0; j < k && !isTaken; j++) {
      const pivot = triangle[j]!;
      if (Math.abs(row[j]!) <= ROUNDING_SHARE * sizes[j]!) continue;
      if (!isFilled[j]) {
        pivot.set(row);
        isFilled[j] = isTaken = true;
        continue;
      }
      const length = Math.hypot(pivot[j]!, row[j]!);
      const [cosine, sine] = [pivot[j]! / length, row[j]! / length];
      for (let i = j; i <= k; i++) {
        const [kept, entering] = [pivot[i]!, row[i]!];
        pivot[i] = cosine * kept + sine * entering;
        row[i] = cosine * entering - sine * kept;
      }
    }
    if (isTaken || !isFilled.every(Boolean)) continue;
    fit.residuals[fit.rows.length] = row[k]!;
    fit.rows.push(t);
    fit.coefficients.push(solutionOf(triangle, k));
  }
  return { ...fit, residuals: fit.residuals.slice(0, fit.rows.length) };
}

function solutionOf(triangle: readonly Float64Array[], k: number): Float64Array {
  const solution = new Float64Array(k);
  for (let j = k - 1; j >= 0; j--) {
    let rest = triangle[j]![k]!;
    for (let i = j + 1; i < k; i++) rest -= triangle[j]![i]! * solution[i]!;
    solution[j] = rest / triangle[j]![j]!;
  }
  return solution;
}
