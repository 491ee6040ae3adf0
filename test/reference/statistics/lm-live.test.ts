import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RegressionRequest } from '../../../src-main/contract/compute.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { regression } from '../../../src-main/statistics/regression.ts';
import { varianceInflation } from '../../../src-main/statistics/variance-inflation.ts';
import { checkRegression } from '../../helpers/check-regression.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: R (as WebAssembly) on real data, in the same run; the R functions are in regression.R.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./regression.R', import.meta.url));
});
afterAll(() => r.close());

const { years, co2Ppm, temperatureK } = co2AndTemperature();
const logRatio = co2Ppm.map((value) => Math.log(value / co2Ppm[0]!));
const warming = temperatureK.map((value) => value - temperatureK[0]!);

type Data = Pick<RegressionRequest, 'x' | 'y' | 'weights'>;

const covariances: RegressionRequest['covariance'][] = [
  { kind: 'classical' },
  { kind: 'hc0' },
  { kind: 'hc1' },
  { kind: 'hc2' },
  { kind: 'hc3' },
  { kind: 'newey-west', lag: 0 },
  { kind: 'newey-west', lag: 3 },
  { kind: 'newey-west', lag: 3, smallSample: true },
  { kind: 'newey-west', lag: 8, smallSample: true },
];

async function compare(data: Data, rel: number, why: string): Promise<void> {
  const columns = typeof data.x[0] === 'number' ? [data.x as number[]] : (data.x as number[][]);
  const largest = Math.max(...data.y.map(Math.abs));
  for (const intercept of [true, false]) {
    for (const covariance of covariances) {
      const fromR = await r.numbers('reference_regression(x, y, nPredictors, intercept, w, kind, lag, small)', {
        x: columns.flat(),
        y: data.y,
        nPredictors: columns.length,
        intercept,
        w: data.weights ?? data.y.map(() => 1),
        kind: covariance.kind,
        lag: covariance.lag ?? 0,
        small: covariance.smallSample ?? false,
      });
      const { caveats, ...figures } = regression({ ...data, intercept, covariance });
      expect(Object.keys(fromR).sort()).toEqual(Object.keys(figures).sort());
      checkRegression({ ...figures, caveats }, fromR, {
        figures: { rel, abs: 0, why },
        tails: {
          rel: rel * data.y.length,
          abs: 1e-300,
          why: `${why}; the tail of t magnifies its rounding up to n − k times`,
        },
        rows: { rel, abs: rel * largest, why: `${why}; a residual is a difference of numbers of y's size` },
      });
    }
  }
}

const TEN_DIGITS = 'two double-precision programs on a well-posed problem';

describe('regression against R, every figure, with and without intercept, nine covariances', () => {
  it('knows which R it is compared with', () => expect(r.version).toBe('R 4.6.0'));

  it('warming on ln(C/C0), anchored at the first year', async () => {
    expect(years.length).toBeGreaterThan(40);
    await compare({ x: logRatio, y: warming }, 1e-10, TEN_DIGITS);
  });

  it('warming on ln(C/C0), weighted by two different sets of weights', async () => {
    const later = years.map((year) => 1 + (year - years[0]!) / 10);
    const alternating = years.map((_, i) => [0.25, 1, 3][i % 3]!);
    await compare({ x: logRatio, y: warming, weights: later }, 1e-10, TEN_DIGITS);
    await compare({ x: logRatio, y: warming, weights: alternating }, 1e-10, TEN_DIGITS);
  });

  it('warming on two predictors that resemble each other', async () => {
    await compare({ x: [logRatio, years.map((year) => year - 1958)], y: warming }, 1e-10, TEN_DIGITS);
  });

  it('LakeHuron on the calendar year', async () => {
    const data = await r.numbers('list(x = time(LakeHuron), y = LakeHuron)');
    await compare({ x: data['x']!, y: data['y']! }, 1e-10, TEN_DIGITS);
    const answer = regression({ x: data['x']!, y: data['y']!, intercept: true, covariance: { kind: 'classical' } });
    const printed = { rel: 0, abs: 5e-9, why: 'half a unit of the last printed digit' };
    expectClose(answer.coefficients[1], -0.0242011106, { ...printed, abs: 5e-11 });
    expectClose(answer.standardErrors[1], 0.0040361079, { ...printed, abs: 5e-11 });
    expectClose(answer.durbinWatson, 0.439493229, { ...printed, abs: 5e-10 });
  });

  it('Mauna Loa CO2 on the calendar year: 0.9985 uncentred is 0.2404 centred', async () => {
    const data = await r.numbers('list(x = 1959:1997, y = aggregate(co2, FUN = mean))');
    await compare({ x: data['x']!, y: data['y']! }, 1e-10, TEN_DIGITS);
    const answer = regression({ x: data['x']!, y: data['y']!, intercept: false, covariance: { kind: 'classical' } });
    expectClose([answer.rSquaredUncentred, answer.rSquaredCentred], [0.998531, 0.240388], {
      rel: 0,
      abs: 5e-7,
      why: 'half a unit of the last printed digit',
    });
  });

  it('longley, six collinear predictors', async () => {
    const data = await r.numbers('as.list(longley)');
    const { Employed, ...predictors } = data;
    const x = Object.values(predictors);
    await compare({ x, y: Employed! }, 1e-9, 'predictors so collinear that either program loses a digit more');

    const inflation = await r.numbers(
      'X <- as.matrix(longley[, 1:6]); list(vif = sapply(1:6, function(j) 1 / (1 - summary(lm(X[, j] ~ X[, -j]))$r.squared)))',
    );
    const fit = leastSquares({ columns: [new Float64Array(16).fill(1), ...x], y: Employed! });
    expectClose(varianceInflation(fit, true), inflation['vif'], { rel: 1e-9, abs: 0, why: '1 − R² cancels in R' });
  });
});
