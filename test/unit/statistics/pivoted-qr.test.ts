import { describe, expect, it } from 'vitest';
import {
  multiplyByQ,
  multiplyByQTransposed,
  pivotedQr,
  solveUpper,
  solveUpperTransposed,
  type PivotedQr,
} from '../../../src-main/statistics/pivoted-qr.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-14, abs: 1e-14, why: 'rounding of a few products of numbers near one' };

const columns = () => [Float64Array.of(1, 1, 1, 1), Float64Array.of(0.5, -2, 3, 1), Float64Array.of(1, 0.25, 2, -1)];

/** Column `place` of R, with zeros below. */
function columnOfR({ columns, diagonal }: PivotedQr, place: number): Float64Array {
  return Float64Array.from(columns[place]!, (value, i) => (i < place ? value : i === place ? diagonal[place]! : 0));
}

describe('pivotedQr', () => {
  it('gives each column back as Q times its column of R, longest first', () => {
    const qr = pivotedQr(columns());
    expect(qr.pivot[0]).toBe(1);
    columns().forEach((_, place) => {
      const product = columnOfR(qr, place);
      multiplyByQ(qr, product);
      expectClose(product, columns()[qr.pivot[place]!]!, rounding);
    });
  });

  it('has an orthogonal Q', () => {
    const qr = pivotedQr(columns());
    const vector = Float64Array.of(3, -1, 4, 1.5);
    const back = vector.slice();
    multiplyByQTransposed(qr, back);
    expectClose(Math.hypot(...back), Math.hypot(...vector), rounding);
    multiplyByQ(qr, back);
    expectClose(back, vector, rounding);
  });

  it('solves with R and with R′', () => {
    const qr = pivotedQr(columns());
    const rightSide = Float64Array.of(2, -3, 5);
    const z = solveUpper(qr, rightSide);
    const w = solveUpperTransposed(qr, rightSide);
    const r = (i: number, j: number) => columnOfR(qr, j)[i]!;
    expectClose(
      [0, 1, 2].map((i) => r(i, 0) * z[0]! + r(i, 1) * z[1]! + r(i, 2) * z[2]!),
      rightSide,
      rounding,
    );
    expectClose(
      [0, 1, 2].map((j) => r(0, j) * w[0]! + r(1, j) * w[1]! + r(2, j) * w[2]!),
      rightSide,
      rounding,
    );
  });

  it('leaves next to nothing of a column that the others give', () => {
    const [a, b] = columns();
    const dependent = a!.map((value, i) => 0.3 * value - 0.7 * b![i]!);
    expect(pivotedQr([...columns().slice(0, 2), dependent]).pivotRatio).toBeLessThan(1e-15);
    expect(pivotedQr([new Float64Array(3), Float64Array.of(1, 2, 3)]).pivotRatio).toBe(0);
    expect(pivotedQr([new Float64Array(3)]).pivotRatio).toBe(0);
  });
});
