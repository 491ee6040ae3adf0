import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { correlation } from '../../../src-main/statistics/correlation.ts';
import { quantile, quantileOfSorted } from '../../../src-main/statistics/quantile.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: R's quantile (type 7) and cor, in the same run.

let r: RSession;
beforeAll(async () => {
  r = await startR();
});
afterAll(() => r.close());

const near = { rel: 1e-13, abs: 0, why: 'a handful of additions' };
const probabilities = [0, 0.01, 0.05, 0.17, 0.25, 1 / 3, 0.5, 0.83, 0.95, 0.999, 1];

describe('order statistics against R', () => {
  it('quantile, for lengths from one to many and in any order', async () => {
    const { Nile = [] } = await r.numbers('list(Nile = Nile)');
    for (const values of [[7], [3, 1], [2, 9, 4], Nile, Nile.slice(0, 42).reverse()]) {
      const { q = [] } = await r.numbers('list(q = quantile(values, p, type = 7))', { values, p: probabilities });
      expectClose(
        probabilities.map((p) => quantile(values, p)),
        q,
        near,
      );
      const sorted = Float64Array.from(values).sort();
      expectClose(
        probabilities.map((p) => quantileOfSorted(sorted, p)),
        q,
        near,
      );
    }
  });

  it('quantile leaves its argument as it is', () => {
    const values = Float64Array.of(3, 1, 2);
    quantile(values, 0.5);
    expect(values).toEqual(Float64Array.of(3, 1, 2));
  });

  it('correlation', async () => {
    const { co2Ppm, temperatureK, years } = co2AndTemperature();
    for (const [x, y] of [
      [co2Ppm, temperatureK],
      [years, temperatureK],
      [years.toReversed(), co2Ppm],
    ] as const) {
      const { v = [] } = await r.numbers('list(v = cor(x, y))', { x: [...x], y: [...y] });
      expectClose([correlation(x, y)], v, near);
    }
  });
});
