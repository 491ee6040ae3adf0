import { describe, expect, it } from 'vitest';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { leaveOneOut } from '../../../src-main/statistics/leave-one-out.ts';
import { expectClose } from '../../helpers/close.ts';

const nRows = 14;
const columns = [
  new Float64Array(nRows).fill(1),
  Float64Array.from({ length: nRows }, (_, t) => t + 0.3 * Math.sin(t * t)),
  Float64Array.from({ length: nRows }, (_, t) => (t % 4) ** 2),
];
const y = Float64Array.from({ length: nRows }, (_, t) => 2 + 0.5 * t + Math.cos(3 * t));
const weights = y.map((_, t) => 1 + (t % 3));
const without = (values: Float64Array, row: number) => values.filter((_, t) => t !== row);
const rounding = { rel: 1e-11, abs: 1e-12, why: 'rounding' };

describe('leaveOneOut', () => {
  it.each([false, true])('level C: fitting anew without each row, weighted %s', (isWeighted) => {
    const fit = leastSquares({ columns, y, weights: isWeighted ? weights : undefined });
    for (const place of [0, 1, 2]) {
      const refits = Array.from(y.keys(), (row) => {
        const refit = leastSquares({
          columns: columns.map((column) => without(column, row)),
          y: without(y, row),
          weights: isWeighted ? without(weights, row) : undefined,
        });
        return refit.coefficients[place]!;
      });
      const { coefficients, mostInfluential, caveats } = leaveOneOut(fit, place);
      expectClose(coefficients, refits, rounding);
      expect(caveats).toEqual([]);
      const moves = refits.map((value) => Math.abs(value - fit.coefficients[place]!));
      expect(mostInfluential?.row).toBe(moves.indexOf(Math.max(...moves)));
      expect(mostInfluential?.coefficient).toBe(coefficients[mostInfluential?.row ?? -1]);
    }
  });

  it('a row that alone decides something has no figure, and is named', () => {
    const step = Float64Array.from({ length: 5 }, (_, t) => (t === 3 ? 1 : 0));
    const fit = leastSquares({ columns: [new Float64Array(5).fill(1), step], y: Float64Array.of(1, 2, 5, 9, 3) });
    const { coefficients, mostInfluential, caveats } = leaveOneOut(fit, 0);
    expect(coefficients[3]).toBeNull();
    expectClose(
      coefficients.filter((value) => value !== null),
      [10 / 3, 3, 2, 8 / 3],
      rounding,
    );
    expect(mostInfluential?.row).toBe(2);
    expect(caveats).toMatchObject([{ code: 'leverage-of-one' }]);
    expect(caveats[0]?.detail).toContain('Without row 4 ');
  });

  it('nothing is left when rows and coefficients are as many', () => {
    const fit = leastSquares({ columns: [Float64Array.of(1, 1), Float64Array.of(1, 3)], y: Float64Array.of(2, 5) });
    expect(leaveOneOut(fit, 1)).toMatchObject({ coefficients: [null, null], mostInfluential: null });
  });

  it('refuses an exact fit, whose most influential row would be one of rounding', () => {
    const fit = leastSquares({ columns, y: columns[1]!.map((value) => 3 - 2 * value) });
    expect(() => leaveOneOut(fit, 1)).toThrow('leaveOneOut: expected residuals that are more than rounding');
  });

  it('refuses a coefficient that the fit does not have', () => {
    expect(() => leaveOneOut(leastSquares({ columns, y }), 3)).toThrow('leaveOneOut, place');
  });
});
