import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { breuschPagan } from '../../src-main/statistics/breusch-pagan.ts';
import { chowTest } from '../../src-main/statistics/chow-test.ts';
import { cusum } from '../../src-main/statistics/cusum.ts';
import { leastSquares } from '../../src-main/statistics/least-squares.ts';
import { resetTest } from '../../src-main/statistics/reset-test.ts';
import { expectClose, type Table } from '../helpers/close.ts';
import { drawnOrder, drawnRecord, inOrder, units } from '../helpers/drawn-record.ts';

// Level D: what must hold of the tests on a line whatever the data.

interface Test {
  name: string;
  of: (x: number[], y: number[]) => Table;
  /** Whether rows may come in any order. */
  anyOrder: boolean;
}

const tests: Test[] = [
  ...(['studentised', 'original'] as const).map((kind) => ({
    name: `breusch-pagan, ${kind}`,
    of: (x: number[], y: number[]) => {
      const { statistic, df, p } = breuschPagan(leastSquares({ columns: [x.map(() => 1), x], y }), true, kind);
      return { statistic, df, p };
    },
    anyOrder: true,
  })),
  ...[[2], [2, 3]].map((powers) => ({
    name: `reset, powers ${powers.join()}`,
    of: (x: number[], y: number[]) => ({ ...resetTest({ x, y, intercept: true, powers }) }),
    anyOrder: true,
  })),
  {
    name: 'chow',
    of: (x, y) => {
      const { statistic, p } = chowTest({ x, y, intercept: true, breakRow: 6 });
      return { statistic, p };
    },
    anyOrder: false,
  },
  {
    name: 'cusum',
    of: (x, y) => {
      const { statistic, p, cusum: sums, firstOutside } = cusum({ x, y, intercept: true, levelPercent: 5 });
      return { statistic, p, sums, firstOutside };
    },
    anyOrder: false,
  },
];

const near = { rel: 1e-7, abs: 1e-7, why: 'rounding; powers of fitted values up to the third cost digits' };

const holds = (check: (record: { x: number[]; y: number[] }, unit: number, key: number) => void) => {
  fc.assert(fc.property(drawnRecord, units, fc.nat(1000), check), { seed: 20_260_104, numRuns: 40 });
};

describe.each(tests)('$name', ({ of, anyOrder }) => {
  it('knows neither unit nor level of x and y', () =>
    holds(({ x, y }, unit, key) => {
      const before = of(x, y);
      expectClose(
        of(
          x,
          y.map((value) => unit * value),
        ),
        before,
        near,
      );
      expectClose(
        of(
          x,
          y.map((value) => value - key / 70),
        ),
        before,
        near,
      );
      expectClose(
        of(
          x.map((value) => unit * value),
          y,
        ),
        before,
        near,
      );
      expectClose(
        of(
          x.map((value) => value + key / 70),
          y,
        ),
        before,
        near,
      );
    }));

  // RESET too: with one predictor and an intercept the powers of the fitted values stand for those of x.
  it('does not mind a multiple of x in y', () =>
    holds(({ x, y }, _, key) => {
      // Not so small that nothing is left of the slope.
      const m = 2 + key / 300;
      const tilted = y.map((value, t) => value + m * x[t]!);
      expectClose(of(x, tilted), of(x, y), near);
    }));

  if (anyOrder) {
    it('does not know the order of the rows', () =>
      holds(({ x, y }, _, key) => {
        const rows = drawnOrder(x.length, key);
        expectClose(of(inOrder(x, rows), inOrder(y, rows)), of(x, y), near);
      }));
  }
});

describe('chow', () => {
  it('does not know the order within a part; read backwards the parts change places', () =>
    holds(({ x, y }, _, key) => {
      const breakRow = 5 + (key % 5);
      const of = (rows: number[], at: number) =>
        chowTest({ x: inOrder(x, rows), y: inOrder(y, rows), intercept: true, breakRow: at });
      const asGiven = [...x.keys()];
      const before = of(asGiven, breakRow);
      const first = drawnOrder(breakRow, key);
      const rest = drawnOrder(x.length - breakRow, key + 1).map((row) => row + breakRow);
      expectClose(of([...first, ...rest], breakRow), before, near);
      const backwards = of(asGiven.toReversed(), x.length - breakRow);
      expectClose(backwards, { ...before, before: before.after, after: before.before }, near);
    }));
});

describe('cusum', () => {
  it('turns round with the sign of y, and its bounds do not know y', () =>
    holds(({ x, y }) => {
      for (const levelPercent of [1, 10] as const) {
        const of = (values: number[]) => cusum({ x, y: values, intercept: true, levelPercent });
        const [before, after] = [of(y), of(y.map((value) => -value))];
        expectClose(
          after.cusum.map((value) => -value),
          before.cusum,
          near,
        );
        expectClose(
          { bound: after.bound, statistic: after.statistic },
          { bound: before.bound, statistic: before.statistic },
          near,
        );
        expect(after.firstOutside).toBe(before.firstOutside);
      }
    }));
});
