/** X P = Q R: R above the diagonal of `columns` with its diagonal apart, the reflectors of Q on and below it. */
export interface PivotedQr {
  columns: readonly Float64Array[];
  diagonal: Float64Array;
  /** Reflector j is I − reflectorScale[j]·u·u′. */
  reflectorScale: Float64Array;
  /** Place j of R belongs to column pivot[j] of X. */
  pivot: readonly number[];
  /** Smallest over largest magnitude on the diagonal of R: 0 when a column is a combination of the others. */
  pivotRatio: number;
}

/**
 * QR decomposition by Householder reflections with column pivoting: at each step the column that is worst explained by
 * those taken so far comes next, so that what remains of the last one says how near the columns are to being dependent.
 *
 * Assumes  columns of comparable length (scale them first), at least as many rows as columns
 *
 * @param columns  nColumns × [nRows], finite; **overwritten**
 *
 * Source   Businger & Golub 1965, Numer. Math. 7, 269–276; Golub & Van Loan 2013, Matrix Computations, algorithm 5.4.1
 * Checked  test/unit/statistics/pivoted-qr.test.ts, level C: Q R gives the columns back; known dependent columns
 */
export function pivotedQr(columns: Float64Array[]): PivotedQr {
  const nColumns = columns.length;
  const pivot = columns.map((_, j) => j);
  const diagonal = new Float64Array(nColumns);
  const reflectorScale = new Float64Array(nColumns);

  for (let step = 0; step < nColumns; step++) {
    let longest = step;
    let longestSquare = -1;
    for (let j = step; j < nColumns; j++) {
      const square = partialProduct(columns[j]!, columns[j]!, step);
      if (square > longestSquare) [longest, longestSquare] = [j, square];
    }
    [columns[step], columns[longest]] = [columns[longest]!, columns[step]!];
    [pivot[step], pivot[longest]] = [pivot[longest]!, pivot[step]!];

    const reflector = columns[step]!;
    const length = Math.sqrt(longestSquare);
    if (length === 0) continue;
    const head = reflector[step]!;
    // The sign that adds magnitudes instead of cancelling them.
    diagonal[step] = head > 0 ? -length : length;
    reflector[step] = head - diagonal[step]!;
    reflectorScale[step] = 1 / (length * (length + Math.abs(head)));
    for (let j = step + 1; j < nColumns; j++) reflect(reflector, reflectorScale[step]!, columns[j]!, step);
  }
  const magnitudes = diagonal.map(Math.abs);
  const pivotRatio = magnitudes[0] === 0 ? 0 : Math.min(...magnitudes) / Math.max(...magnitudes);
  return { columns, diagonal, reflectorScale, pivot, pivotRatio };
}

/** vector ← Q′ vector */
export function multiplyByQTransposed({ columns, reflectorScale }: PivotedQr, vector: Float64Array): void {
  for (let j = 0; j < columns.length; j++) reflect(columns[j]!, reflectorScale[j]!, vector, j);
}

/** vector ← Q vector */
export function multiplyByQ({ columns, reflectorScale }: PivotedQr, vector: Float64Array): void {
  for (let j = columns.length - 1; j >= 0; j--) reflect(columns[j]!, reflectorScale[j]!, vector, j);
}

/** Solves R z = right side, in R's own order of columns; only the first nColumns elements of the right side count. */
export function solveUpper({ columns, diagonal }: PivotedQr, rightSide: Float64Array): Float64Array {
  const solution = rightSide.slice(0, columns.length);
  for (let j = columns.length - 1; j >= 0; j--) {
    solution[j]! /= diagonal[j]!;
    for (let i = 0; i < j; i++) solution[i]! -= columns[j]![i]! * solution[j]!;
  }
  return solution;
}

/** Solves R′ z = right side, in R's own order of columns. */
export function solveUpperTransposed({ columns, diagonal }: PivotedQr, rightSide: Float64Array): Float64Array {
  const solution = rightSide.slice(0, columns.length);
  for (let j = 0; j < columns.length; j++) {
    for (let i = 0; i < j; i++) solution[j]! -= columns[j]![i]! * solution[i]!;
    solution[j]! /= diagonal[j]!;
  }
  return solution;
}

function reflect(reflector: Float64Array, scale: number, vector: Float64Array, from: number): void {
  const factor = scale * partialProduct(reflector, vector, from);
  for (let i = from; i < vector.length; i++) vector[i]! -= factor * reflector[i]!;
}

function partialProduct(a: Float64Array, b: Float64Array, from: number): number {
  let total = 0;
  for (let i = from; i < a.length; i++) total += a[i]! * b[i]!;
  return total;
}
