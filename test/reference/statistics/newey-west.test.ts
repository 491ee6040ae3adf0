import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RegressionRequest } from '../../../src-main/contract/compute.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { neweyWestAutomaticLag } from '../../../src-main/statistics/newey-west-automatic-lag.ts';
import { regression } from '../../../src-main/statistics/regression.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: base R on R's own series and on the real record, in the same run; the R functions are in newey-west.R.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./newey-west.R', import.meta.url));
});
afterAll(() => r.close());

const near = { rel: 1e-8, abs: 0, why: 'bread %*% meat %*% bread in R keeps half of the digits' };

type Data = Pick<RegressionRequest, 'x' | 'y' | 'weights'> & { years: number[] };
type Options = Omit<RegressionRequest['covariance'], 'kind'>;

const { years: realYears, co2Ppm, temperatureK } = co2AndTemperature();
/** The one year that the record misses is closed up: the gaps here are those that `gapped` makes. */
const years = realYears.map((_, row) => 1959 + row);
const record: Data = { x: co2Ppm.map((ppm) => Math.log(ppm / co2Ppm[0]!)), y: temperatureK, years };

async function series(): Promise<Data[]> {
  const lake = await r.numbers('list(x = time(LakeHuron), y = LakeHuron)');
  const co2 = await r.numbers('list(x = 1959:1997, y = aggregate(co2, FUN = mean))');
  const monthly = await r.numbers('list(x = time(co2) - 1978, y = co2 - mean(co2))');
  return [
    { x: lake['x']!, y: lake['y']!, years: lake['x']! },
    { x: co2['x']!.map((year) => year - 1978), y: co2['y']!, years: co2['x']! },
    { x: monthly['x']!, y: monthly['y']!, years: monthly['y']!.map((_, row) => row) },
    record,
    { ...record, weights: years.map((_, i) => [0.25, 1, 3][i % 3]!) },
    { ...record, x: [record.x as number[], years.map((year) => Math.sin(year))] },
  ];
}

/** Every fifth row and the two after it left out: gaps of one and of three years. */
function gapped({ x, y, weights, years }: Data): Data {
  const kept = (values: number[]) => values.filter((_, row) => row % 11 !== 4 && ![20, 21, 22].includes(row));
  return {
    x: typeof x[0] === 'number' ? kept(x as number[]) : (x as number[][]).map(kept),
    y: kept(y),
    years: kept(years),
    ...(weights ? { weights: kept(weights) } : {}),
  };
}

/** How often the scores grow by R's VAR(1), so that prewhitening is refused. */
async function compare({ years, ...data }: Data, options: Options): Promise<number> {
  let nRefused = 0;
  const columns = typeof data.x[0] === 'number' ? [data.x as number[]] : (data.x as number[][]);
  for (const intercept of [true, false]) {
    const {
      covariance,
      lag,
      growth = [],
    } = await r.numbers('newey_west(x, y, nPredictors, intercept, w, lag, prewhiten, small, years)', {
      x: columns.flat(),
      y: data.y,
      nPredictors: columns.length,
      intercept,
      w: data.weights ?? data.y.map(() => 1),
      lag: typeof options.lag === 'number' ? options.lag : -1,
      prewhiten: options.prewhiten === 'var1',
      small: options.smallSample ?? false,
      years,
    });
    const ask = () => regression({ ...data, years, intercept, covariance: { kind: 'newey-west', ...options } });
    if (growth[0]! >= 1) {
      expect(ask).toThrow(`an eigenvalue of ${growth[0]!.toPrecision(3)}`);
      nRefused++;
      continue;
    }
    const answer = ask();
    expectClose(answer.covarianceMatrix.flat(), covariance, near);
    expect(answer.chosenLag).toBe(options.lag === 'newey-west-1994' ? lag?.[0] : undefined);
  }
  return nRefused;
}

describe('Newey–West against base R: LakeHuron, co2 by year and by month, the real record plain, weighted and with two predictors', () => {
  it.each<Options>([
    { lag: 'newey-west-1994' },
    { lag: 'newey-west-1994', smallSample: true },
    { lag: 'newey-west-1994', prewhiten: 'var1' },
    { lag: 4, prewhiten: 'var1' },
    { lag: 0, prewhiten: 'var1', smallSample: true },
  ])('%j', async (options) => {
    let nRefused = 0;
    for (const data of await series()) nRefused += await compare(data, options);
    // CO2 on the year through the origin leaves residuals that do not forget.
    expect(nRefused).toBe(options.prewhiten ? 1 : 0);
  });

  it.each<Options>([{ lag: 1 }, { lag: 5, smallSample: true }, { lag: 'newey-west-1994' }])(
    '%j, by calendar distance across gaps',
    async (options) => {
      for (const data of await series()) await compare(gapped(data), options);
    },
  );

  it('gaps matter to these series: closed up they give other errors', async () => {
    for (const data of await series()) {
      const { years, ...rows } = gapped(data);
      const errors = (more: { years?: number[] }) =>
        regression({ ...rows, ...more, intercept: true, covariance: { kind: 'newey-west', lag: 5 } }).standardErrors;
      const [closed, calendar] = [errors({}), errors({ years })];
      expect(Math.abs(closed[1]! / calendar[1]! - 1)).toBeGreaterThan(0.005);
    }
  });

  it('chooses more lags where the past is remembered for longer', async () => {
    const ar = (rho: number) => r.numbers('set.seed(3); list(y = as.double(arima.sim(list(ar = rho), 400)))', { rho });
    const lags = [];
    for (const rho of [0.05, 0.5, 0.9]) {
      const { y = [] } = await ar(rho);
      const fit = leastSquares({ columns: [new Float64Array(400).fill(1), y.map((_, t) => t - 199.5)], y });
      lags.push(neweyWestAutomaticLag(fit, { hasIntercept: true }).lag);
    }
    expect(lags).toEqual([...lags].sort((a, b) => a - b));
    expect(lags[2]!).toBeGreaterThan(2 * lags[0]!);
  });
});

describe('neweyWestAutomaticLag', () => {
  it('by hand: a constant alone, whose score is the residual', () => {
    // Residuals 3, 1, −1, −3 twice over, about a mean of zero; T = 8, m = floor(4 · 0.08^(2/9)) = floor(2.28) = 2.
    const y = [3, 1, -1, -3, 3, 1, -1, -3];
    const fit = leastSquares({ columns: [new Float64Array(8).fill(1)], y });
    // σ0 = 40; σ1 = 3 − 1 + 3 − 9 + 3 − 1 + 3 = 1; σ2 = −6 · 3 = −18; s1/s0 = (2 − 72)/(40 + 2 − 36)
    const chosen = neweyWestAutomaticLag(fit, { hasIntercept: true });
    expect(chosen).toMatchObject({ preliminaryLag: 2 });
    expectClose(chosen.gamma, 1.1447 * Math.cbrt((70 / 6) ** 2), { rel: 1e-12, abs: 0, why: 'a few operations' });
    // 1.1447 · 5.144 · 2 = 11.8, of which seven rows before the last are left.
    expect(chosen.lag).toBe(7);
  });

  it('refuses autocovariances that cancel', () => {
    // σ0 + 2σ1 + 2σ2 = 0: residuals 1, −1, 0 … with T = 3, m = floor(4 · 0.03^(2/9)) = 1: 2 − 2 = 0.
    const fit = leastSquares({ columns: [[1, 1, 1]], y: [1, -1, 0] });
    expect(() => neweyWestAutomaticLag(fit, { hasIntercept: true })).toThrow('a sum of zero over 1 lags');
  });
});
