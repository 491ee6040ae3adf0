import fc from 'fast-check';
import { describe, it } from 'vitest';
import type { RegressionRequest } from '../../src-main/contract/compute.ts';
import { breuschGodfrey } from '../../src-main/statistics/breusch-godfrey.ts';
import { correlation } from '../../src-main/statistics/correlation.ts';
import { designColumns } from '../../src-main/statistics/design-columns.ts';
import { durbinWatson } from '../../src-main/statistics/durbin-watson.ts';
import { lagOneAutocorrelation } from '../../src-main/statistics/lag-one-autocorrelation.ts';
import { leastSquares } from '../../src-main/statistics/least-squares.ts';
import { ljungBox } from '../../src-main/statistics/ljung-box.ts';
import { quantile } from '../../src-main/statistics/quantile.ts';
import { regression } from '../../src-main/statistics/regression.ts';
import { sum, sumOfProducts } from '../../src-main/statistics/summation.ts';
import { expectClose } from '../helpers/close.ts';

// Level D: what must hold whatever the data. Data are whole thousandths, so that no example is near an exact fit by
// accident of rounding; the seed is fixed so that a failure is the same tomorrow.

const options = { seed: 20_260_101, numRuns: 60 };
const rounding = { rel: 1e-9, abs: 1e-9, why: 'rounding of data of size 1 … 100 and a moderate condition number' };

const value = fc.integer({ min: -20_000, max: 20_000 }).map((thousandths) => thousandths / 1000);

/** Rows (x, z, y, weight) whose predictors vary: a time-like column with noise, and an oscillation with noise. */
const rows = fc
  .array(fc.record({ a: value, b: value, y: value, w: fc.integer({ min: 1, max: 8 }) }), {
    minLength: 12,
    maxLength: 40,
  })
  .map((noise) => ({
    x: noise.map(({ a }, i) => i + a / 10),
    z: noise.map(({ b }, i) => (i % 3) * 5 + b / 10),
    y: noise.map(({ y }, i) => y + 0.25 * i),
    weights: noise.map(({ w }) => w / 4),
  }));

const covariance = fc.constantFrom<RegressionRequest['covariance']>(
  { kind: 'classical' },
  { kind: 'hc0' },
  { kind: 'hc1' },
  { kind: 'hc2' },
  { kind: 'hc3' },
  { kind: 'newey-west', lag: 2 },
  { kind: 'newey-west', lag: 5, smallSample: true },
);

const setting = fc.record({ data: rows, covariance, intercept: fc.boolean(), isWeighted: fc.boolean() });

type Setting = typeof setting extends fc.Arbitrary<infer T> ? T : never;

const request = ({ data, covariance, intercept, isWeighted }: Setting): RegressionRequest => ({
  x: [data.x, data.z],
  y: data.y,
  intercept,
  covariance,
  ...(isWeighted ? { weights: data.weights } : {}),
});

/** What no change of unit may touch. */
const invariants = (answer: ReturnType<typeof regression>, from = 0) => ({
  t: answer.t.slice(from),
  uncentred: answer.rSquaredUncentred,
  centred: answer.rSquaredCentred,
  durbinWatson: answer.durbinWatson,
  leverage: answer.leverage,
  cooksDistance: answer.cooksDistance,
});

const powers = [0.001, 0.5, 3, 1000];

describe('regression', () => {
  it('follows the unit of y', () => {
    fc.assert(
      fc.property(setting, fc.constantFrom(...powers), (given, c) => {
        const before = regression(request(given));
        const after = regression({ ...request(given), y: given.data.y.map((y) => c * y) });
        expectClose(
          after.coefficients.map((b) => b / c),
          before.coefficients,
          rounding,
        );
        expectClose(
          after.standardErrors.map((s) => s / c),
          before.standardErrors,
          rounding,
        );
        expectClose(invariants(after), invariants(before), rounding);
        expectClose(after.logLikelihood! + given.data.y.length * Math.log(c), before.logLikelihood, rounding);
      }),
      options,
    );
  });

  it('follows the unit of a predictor', () => {
    fc.assert(
      fc.property(setting, fc.constantFrom(...powers), (given, c) => {
        const before = regression(request(given));
        const after = regression({ ...request(given), x: [given.data.x.map((x) => c * x), given.data.z] });
        const place = given.intercept ? 1 : 0;
        expectClose(after.coefficients[place]! * c, before.coefficients[place], rounding);
        expectClose(after.standardErrors[place]! * c, before.standardErrors[place], rounding);
        expectClose(after.residuals, before.residuals, rounding);
        expectClose(invariants(after), invariants(before), rounding);
      }),
      options,
    );
  });

  it('with an intercept, a shift of y moves the intercept alone', () => {
    fc.assert(
      fc.property(setting, fc.constantFrom(-40, 300), (given, shift) => {
        const asked = { ...request(given), intercept: true };
        const before = regression(asked);
        const after = regression({ ...asked, y: given.data.y.map((y) => y + shift) });
        expectClose(after.coefficients[0]! - shift, before.coefficients[0], rounding);
        expectClose(after.coefficients.slice(1), before.coefficients.slice(1), rounding);
        expectClose(after.covarianceMatrix, before.covarianceMatrix, rounding);
        expectClose(after.rSquaredCentred, before.rSquaredCentred, rounding);
      }),
      options,
    );
  });

  it('adding a multiple of a predictor to y adds the multiple to its coefficient', () => {
    fc.assert(
      fc.property(setting, fc.constantFrom(-3, 0.7), (given, slope) => {
        const before = regression(request(given));
        const after = regression({ ...request(given), y: given.data.y.map((y, i) => y + slope * given.data.x[i]!) });
        const place = given.intercept ? 1 : 0;
        expectClose(after.coefficients[place]! - slope, before.coefficients[place], rounding);
        expectClose(after.covarianceMatrix, before.covarianceMatrix, rounding);
      }),
      options,
    );
  });

  it('without newey-west, the order of the rows does not matter', () => {
    fc.assert(
      fc.property(setting, fc.infiniteStream(fc.nat()), (given, keys) => {
        const order = given.data.y
          .map((_, i) => ({ i, key: keys.next().value as number }))
          .sort((a, b) => a.key - b.key || a.i - b.i);
        const shuffled = (values: number[]) => order.map(({ i }) => values[i]!);
        const { x, z, y, weights } = given.data;
        const asked = {
          ...given,
          covariance: given.covariance.kind === 'newey-west' ? { kind: 'hc1' as const } : given.covariance,
        };
        const before = regression(request(asked));
        const after = regression(
          request({ ...asked, data: { x: shuffled(x), z: shuffled(z), y: shuffled(y), weights: shuffled(weights) } }),
        );
        expectClose(after.coefficients, before.coefficients, rounding);
        expectClose(after.covarianceMatrix, before.covarianceMatrix, rounding);
        expectClose(after.cooksDistance, shuffled(before.cooksDistance as number[]), rounding);
      }),
      options,
    );
  });

  it('reversing time changes nothing that newey-west says', () => {
    fc.assert(
      fc.property(setting, (given) => {
        const { x, z, y, weights } = given.data;
        const reversed = { x: x.toReversed(), z: z.toReversed(), y: y.toReversed(), weights: weights.toReversed() };
        const before = regression(request(given));
        const after = regression(request({ ...given, data: reversed }));
        expectClose(after.covarianceMatrix, before.covarianceMatrix, rounding);
        expectClose(after.durbinWatson, before.durbinWatson, rounding);
      }),
      options,
    );
  });

  it('swapping the predictors swaps their figures', () => {
    fc.assert(
      fc.property(setting, (given) => {
        const before = regression(request(given));
        const after = regression({ ...request(given), x: [given.data.z, given.data.x] });
        const slopes = (values: number[]) => values.slice(-2);
        expectClose(slopes(after.coefficients).toReversed(), slopes(before.coefficients), rounding);
        expectClose(slopes(after.standardErrors).toReversed(), slopes(before.standardErrors), rounding);
      }),
      options,
    );
  });
});

describe('leastSquares', () => {
  it('leaves residuals that no column can still explain, and leverages that add up to the coefficients', () => {
    fc.assert(
      fc.property(rows, fc.boolean(), ({ x, z, y, weights }, intercept) => {
        const columns = designColumns('test', [x, z], y.length, intercept);
        const fit = leastSquares({ columns, y, weights });
        const weighted = fit.residuals.map((e, i) => e * weights[i]!);
        for (const column of columns) {
          expectClose(sumOfProducts(column, weighted), 0, { rel: 0, abs: 1e-10, why: 'rounding of a sum of size 1e4' });
        }
        expectClose(sum(fit.leverage), columns.length, rounding);
        expectClose(
          Array.from(fit.fitted, (value, i) => value + fit.residuals[i]!),
          y,
          rounding,
        );
      }),
      options,
    );
  });
});

describe('serial correlation', () => {
  it('does not know the unit, and demeaned figures not the level', () => {
    fc.assert(
      fc.property(rows, fc.constantFrom(...powers), fc.constantFrom(-50, 20), ({ x, y }, c, shift) => {
        const moved = y.map((value) => c * value + shift);
        expectClose(lagOneAutocorrelation(moved), lagOneAutocorrelation(y), rounding);
        expectClose(ljungBox(moved, 3).statistic, ljungBox(y, 3).statistic, rounding);
        expectClose(durbinWatson(y.map((value) => c * value)), durbinWatson(y), rounding);
        const bg = (values: number[]) =>
          breuschGodfrey(leastSquares({ columns: designColumns('test', x, x.length, true), y: values }), 2).statistic;
        expectClose(bg(moved), bg(y), { ...rounding, rel: 1e-7, abs: 1e-7 });
      }),
      options,
    );
  });
});

describe('correlation', () => {
  it('is symmetric, between −1 and 1, and knows neither unit nor level; a negative unit turns its sign', () => {
    fc.assert(
      fc.property(rows, fc.constantFrom(...powers), ({ z, y }, c) => {
        const r = correlation(z, y);
        expectClose(correlation(y, z), r, rounding);
        expectClose(
          correlation(
            z.map((value) => -c * value + 3),
            y,
          ),
          -r,
          rounding,
        );
        expectClose(correlation(z, z), 1, rounding);
        expectClose(Math.sign(1 - Math.abs(r)), 1, rounding);
      }),
      options,
    );
  });
});

describe('quantile', () => {
  it('grows with the probability, ignores order, follows unit and level, and mirrors', () => {
    fc.assert(
      fc.property(rows, fc.double({ min: 0, max: 1, noNaN: true }), fc.constantFrom(...powers), ({ y }, p, c) => {
        const q = quantile(y, p);
        expectClose(quantile(y.toReversed(), p), q, rounding);
        expectClose(
          quantile(
            y.map((value) => c * value - 7),
            p,
          ),
          c * q - 7,
          rounding,
        );
        expectClose(
          -quantile(
            y.map((value) => -value),
            1 - p,
          ),
          q,
          rounding,
        );
        expectClose(Math.min(quantile(y, Math.min(1, p + 0.1)) - q, 0), 0, rounding);
      }),
      options,
    );
  });
});
