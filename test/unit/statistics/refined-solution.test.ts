import { describe, expect, it } from 'vitest';
import { multiplyByQTransposed, pivotedQr, solveUpper } from '../../../src-main/statistics/pivoted-qr.ts';
import { refinedSolution } from '../../../src-main/statistics/refined-solution.ts';

describe('refinedSolution', () => {
  // Powers of 1, 7/8 … 1/8, whose products with whole numbers are exact: the true coefficients are 1, −2, 3, −4, 5, −6.
  const x = Float64Array.from({ length: 8 }, (_, i) => 1 - i / 8);
  const design = [0, 1, 2, 3, 4, 5].map((power) => x.map((value) => value ** power));
  const exact = Float64Array.of(1, -2, 3, -4, 5, -6);
  const y = x.map((_, i) => exact.reduce((total, b, j) => total + b * design[j]![i]!, 0) / 8);
  const qr = pivotedQr(design.map((column) => column.slice()));

  it('finds exact coefficients that a single pass misses', () => {
    const once = y.slice();
    multiplyByQTransposed(qr, once);
    const single = solveUpper(qr, once);
    expect(qr.pivot.map((place, j) => single[j]! * 8 === exact[place])).toContain(false);

    const { solution, remainder } = refinedSolution('test', design, y, qr);
    expect(solution.map((value) => value * 8)).toEqual(exact);
    expect(remainder).toEqual(new Float64Array(8));
  });

  it('refuses what does not settle, in the name of the caller', () => {
    // A decomposition that belongs to other columns stands for one that rounding has spoilt.
    const other = pivotedQr(design.map((column, j) => column.map((value, i) => value * (1 + ((i * (j + 3)) % 5)))));
    expect(() => refinedSolution('trend', design, y, other)).toThrow('trend: expected a solution that stands still');
  });
});
