import { describe, expect, it } from 'vitest';
import type { RegressionRequest } from '../../../src-main/contract/compute.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { regressionCaveats } from '../../../src-main/statistics/regression-caveats.ts';

type Kind = RegressionRequest['covariance']['kind'];

const wave = (nObs: number) => Array.from({ length: nObs }, (_, i) => [0, 1, -1, 2, -2, 1, 0][i % 7]! + i / 100);

/** Caveats of a fit on alternating ±1, where every row has the same leverage. */
function caveats(nObs: number, change: { kind?: Kind; lag?: number; x?: number[][] } = {}) {
  const alternating = Array.from({ length: nObs }, (_, i) => (i % 2 === 0 ? 1 : -1));
  const columns = [Array<number>(nObs).fill(1), ...(change.x ?? [alternating])];
  return regressionCaveats({
    fit: leastSquares({ columns, y: wave(nObs) }),
    hasIntercept: true,
    kind: change.kind ?? 'classical',
    lag: change.lag ?? null,
    isExact: false,
    isConstant: false,
  });
}
const codes = (...parameters: Parameters<typeof caveats>) => caveats(...parameters).map(({ code }) => code);

describe('regressionCaveats', () => {
  it('has nothing to say of a well-posed regression', () => expect(codes(40)).toEqual([]));

  it('few-degrees-of-freedom below 10', () => {
    expect(codes(12)).toEqual([]);
    expect(codes(11)).toEqual(['few-degrees-of-freedom']);
  });

  it('high-leverage above 3k/n, with the row', () => {
    const x = Array.from({ length: 40 }, (_, i) => (-1) ** i);
    expect(codes(40, { x: [x.with(7, 2.3)] })).toEqual([]);
    expect(caveats(40, { x: [x.with(7, 2.5)] })).toMatchObject([
      {
        code: 'high-leverage',
        detail: expect.stringContaining('1 of 40 rows with leverage above 3k/n = 0.150; the highest, row 8,') as string,
      },
    ]);
  });

  it('leverage-of-one where a row alone decides a coefficient', () => {
    const x = Array<number>(40).fill(0).with(4, 1);
    expect(caveats(40, { x: [x] })).toMatchObject([
      { code: 'high-leverage' },
      { code: 'leverage-of-one', detail: expect.stringContaining('(row 5)') as string },
    ]);
  });

  it('collinear above a variance inflation of 10', () => {
    // With u and v uncorrelated and of equal variance, u and u + s·v have inflation 1 + 1/s².
    const u = Array.from({ length: 40 }, (_, i) => (i % 2 === 0 ? 1 : -1));
    const v = Array.from({ length: 40 }, (_, i) => (i % 4 < 2 ? 1 : -1));
    const second = (s: number) => u.map((value, i) => value + s * v[i]!);
    expect(codes(40, { x: [u, second(0.34)] })).toEqual([]);
    expect(caveats(40, { x: [u, second(0.33)] })).toMatchObject([
      { code: 'collinear', detail: expect.stringContaining('10.2') as string },
    ]);
  });

  it('short-series-for-lag when L + 1 exceeds a tenth of the rows', () => {
    expect(codes(40, { kind: 'newey-west', lag: 3 })).toEqual(['classical-f']);
    expect(codes(40, { kind: 'newey-west', lag: 4 })).toEqual(['short-series-for-lag', 'classical-f']);
  });

  it('ill-conditioned below a pivot ratio of 1e-7, with the digits that are left', () => {
    const fit = leastSquares({ columns: [Array<number>(40).fill(1), wave(40)], y: wave(40).toReversed() });
    const doubts = {
      hasIntercept: true,
      kind: 'classical' as const,
      lag: null,
      isExact: false,
      isConstant: false,
    };
    const found = (pivotRatio: number) => regressionCaveats({ ...doubts, fit: { ...fit, pivotRatio } });
    expect(found(1.1e-7)).toEqual([]);
    expect(found(0.9e-7)).toMatchObject([
      { code: 'ill-conditioned', detail: expect.stringContaining('about 7 digits') as string },
    ]);
  });

  it('exact-fit, constant-response and no-intercept as told', () => {
    const fit = leastSquares({ columns: [Array.from({ length: 40 }, (_, i) => 1 + (i % 2) / 10)], y: wave(40) });
    const found = regressionCaveats({
      fit,
      hasIntercept: false,
      kind: 'hc0',
      lag: null,
      isExact: true,
      isConstant: true,
    });
    expect(found.map(({ code }) => code)).toEqual(['exact-fit', 'constant-response', 'no-intercept']);
  });
});
