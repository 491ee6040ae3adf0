import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { adf } from '../../src-main/statistics/adf.ts';
import { effectiveSampleSizes } from '../../src-main/statistics/effective-sample-sizes.ts';
import { engleGranger } from '../../src-main/statistics/engle-granger.ts';
import { jarqueBera } from '../../src-main/statistics/jarque-bera.ts';
import { kpss } from '../../src-main/statistics/kpss.ts';
import { expectClose } from '../helpers/close.ts';
import { drawnOrder, drawnRecord, inOrder, units } from '../helpers/drawn-record.ts';

// Level D: what must hold of the tests on series whatever the data.

const options = { seed: 20_260_103, numRuns: 40 };
const near = { rel: 1e-8, abs: 1e-8, why: 'rounding of data of size 1 … 10 000 and a moderate condition number' };

type Series = { x: number[]; y: number[] };
const holds = (check: (record: Series, unit: number, key: number) => void) => {
  fc.assert(fc.property(drawnRecord, units, fc.nat(1000), check), options);
};

const deterministics = ['constant', 'trend'] as const;

describe('adf', () => {
  it('knows neither unit nor sign; with a constant not the level; with a trend no trend', () =>
    holds(({ y }, unit, key) => {
      const of = (values: number[], deterministic: 'none' | 'constant' | 'trend') => {
        const { statistic, p, critical } = adf({ y: values, lags: key % 3, deterministic });
        return { statistic, p, critical };
      };
      const scaled = y.map((value) => -unit * value);
      for (const deterministic of ['none', ...deterministics] as const) {
        expectClose(of(scaled, deterministic), of(y, deterministic), near);
      }
      const shifted = y.map((value) => value + key / 7);
      for (const deterministic of deterministics) expectClose(of(shifted, deterministic), of(y, deterministic), near);
      expectClose(
        of(
          y.map((value, t) => value + (key / 300) * t),
          'trend',
        ),
        of(y, 'trend'),
        near,
      );
    }));
});

describe('kpss', () => {
  it('knows neither unit, sign nor level; with a trend no trend; and time may run backwards', () =>
    holds(({ y }, unit, key) => {
      for (const deterministic of deterministics) {
        const of = (values: number[]) => kpss({ y: values, lags: key % 4, deterministic }).statistic;
        expectClose(of(y.map((value) => -unit * value + key / 7)), of(y), near);
        expectClose(of(y.toReversed()), of(y), near);
        if (deterministic === 'trend') expectClose(of(y.map((value, t) => value + (key / 300) * t)), of(y), near);
      }
    }));
});

describe('engle-granger', () => {
  it('knows neither unit nor level of either series; a multiple of x in y changes nothing', () =>
    holds(({ x, y }, unit, key) => {
      for (const deterministic of deterministics) {
        // A walk: x itself is close to the trend.
        let sum = 0;
        const walk = x.map((value, t) => (sum += value - t + ((t * 7 + key) % 5) - 2));
        const of = (predictor: number[], values: number[]) => {
          const { statistic, p } = engleGranger({ x: predictor, y: values, lags: key % 2, deterministic });
          return { statistic, p };
        };
        const before = of(walk, y);
        expectClose(
          of(
            walk.map((value) => -unit * value + key),
            y,
          ),
          before,
          near,
        );
        expectClose(
          of(
            walk,
            y.map((value) => -unit * value + key / 7),
          ),
          before,
          near,
        );
        expectClose(
          of(
            walk,
            y.map((value, t) => value + (key / 300) * walk[t]!),
          ),
          before,
          near,
        );
        if (deterministic === 'trend')
          expectClose(
            of(
              walk,
              y.map((value, t) => value - (key / 90) * t),
            ),
            before,
            near,
          );
      }
    }));

  it('with two predictors, does not know which comes first', () =>
    holds(({ x, y }) => {
      const other = y.map((value, t) => Math.sin(3 * t) + value / 9);
      const of = (predictors: number[][]) => engleGranger({ x: predictors, y, lags: 1, deterministic: 'constant' });
      expectClose(of([x, other]).statistic, of([other, x]).statistic, near);
    }));
});

describe('jarque-bera', () => {
  it('knows neither unit, level nor order; a sign turns the skewness alone', () =>
    holds(({ y }, unit, key) => {
      const before = jarqueBera(y);
      expectClose(jarqueBera(y.map((value) => unit * value - key / 7)), before, near);
      expectClose(jarqueBera(inOrder(y, drawnOrder(y.length, key))), before, near);
      expectClose(jarqueBera(y.map((value) => -value)), { ...before, skewness: -before.skewness }, near);
    }));
});

describe('effective-sample-size', () => {
  it('knows neither unit, sign nor level, and time may run backwards, under every definition', () =>
    holds(({ y }, unit, key) => {
      const of = (values: number[]) => {
        const { caveats, ...sizes } = effectiveSampleSizes({ values, lags: 1 + (key % 4) });
        return { ...sizes, codes: caveats.map(({ code }) => code) };
      };
      expectClose(of(y.map((value) => -unit * value + key / 7)), of(y), near);
      expectClose(of(y.toReversed()), of(y), near);
    }));

  it('falls as neighbours become more alike', () =>
    holds(({ y }) => {
      // A moving sum of more values carries over for longer.
      const sums = (width: number) => y.slice(width).map((_, t) => y.slice(t, t + width).reduce((a, b) => a + b, 0));
      const all = [y, sums(4)].map((values) => effectiveSampleSizes({ values, lags: 1 }));
      const [one, other] = all as [(typeof all)[0], (typeof all)[0]];
      expect(Math.sign(one.santer2000 / one.nObs - other.santer2000 / other.nObs)).toBe(
        Math.sign(other.lag1 - one.lag1),
      );
      expect(Math.sign(one.ar1Mean / one.nObs - other.ar1Mean / other.nObs)).toBe(Math.sign(other.lag1 - one.lag1));
    }));
});
