import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { breuschGodfrey, type LagTest } from '../../../src-main/statistics/breusch-godfrey.ts';
import { designColumns } from '../../../src-main/statistics/design-columns.ts';
import { durbinWatson } from '../../../src-main/statistics/durbin-watson.ts';
import { lagOneAutocorrelation } from '../../../src-main/statistics/lag-one-autocorrelation.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { ljungBox } from '../../../src-main/statistics/ljung-box.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RNumbers, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: R on its own LakeHuron series and on the real record, in the same run; the R functions are beside this file.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./serial-correlation.R', import.meta.url));
});
afterAll(() => r.close());

const near = { rel: 1e-10, abs: 0, why: 'two double-precision programs on well-posed problems' };

function checkLagTest(answer: LagTest, fromR: RNumbers): void {
  expectClose(Object.fromEntries(Object.entries(answer).map(([name, value]) => [name, [value]])), fromR, near);
}

const { years, co2Ppm, temperatureK } = co2AndTemperature();
const record = {
  x: co2Ppm.map((value) => Math.log(value / co2Ppm[0]!)),
  y: temperatureK.map((value) => value - temperatureK[0]!),
};

async function lakeHuron() {
  const { x = [], y = [] } = await r.numbers('list(x = time(LakeHuron), y = LakeHuron)');
  return { x, y };
}

describe('serial correlation against R', () => {
  it('breuschGodfrey, with and without intercept, lags 1, 2 and 5', async () => {
    for (const { x, y } of [record, await lakeHuron()]) {
      for (const [intercept, formula] of [
        [true, 'y ~ x'],
        [false, 'y ~ x - 1'],
      ] as const) {
        for (const lags of [1, 2, 5]) {
          const fit = leastSquares({ columns: designColumns('test', x, y.length, intercept), y });
          checkLagTest(
            breuschGodfrey(fit, lags),
            await r.numbers(`breusch_godfrey(lm(${formula}), ${lags})`, { x, y }),
          );
        }
      }
    }
  });

  it('breuschGodfrey with two predictors', async () => {
    const time = years.map((year) => year - 1958);
    const fit = leastSquares({ columns: designColumns('test', [record.x, time], record.y.length, true), y: record.y });
    const fromR = await r.numbers('breusch_godfrey(lm(y ~ x + time), 3)', { ...record, time });
    checkLagTest(breuschGodfrey(fit, 3), fromR);
  });

  it('ljungBox, lags 1 and 6, none and two coefficients fitted', async () => {
    for (const series of [record.y, (await lakeHuron()).y]) {
      for (const [lags, fitdf] of [
        [1, 0],
        [6, 0],
        [6, 2],
      ] as const) {
        checkLagTest(ljungBox(series, lags, fitdf), await r.numbers(`box(y, ${lags}, ${fitdf})`, { y: series }));
      }
    }
  });

  it('lagOneAutocorrelation: LakeHuron about its trend', async () => {
    const { x, y } = await lakeHuron();
    const fit = leastSquares({ columns: designColumns('test', x, y.length, true), y });
    const { r: fromR = [] } = await r.numbers('list(r = lag_one(residuals(lm(y ~ x))))', { x, y });
    const lagOne = lagOneAutocorrelation(fit.residuals);
    expectClose([lagOne], fromR, near);
    expectClose(lagOne, 0.761596334, { rel: 0, abs: 5e-10, why: 'half a unit of the last printed digit' });
  });

  it('lagOneAutocorrelation takes the mean off: residuals through the origin do not average to zero', async () => {
    const fit = leastSquares({ columns: designColumns('test', record.x, record.y.length, false), y: record.y });
    const { r: fromR = [] } = await r.numbers('list(r = lag_one(residuals(lm(y ~ x - 1))))', record);
    expectClose([lagOneAutocorrelation(fit.residuals)], fromR, near);
  });

  it('durbinWatson of a random walk and of alternating values', async () => {
    const { walk = [], dw = [] } = await r.numbers(
      'set.seed(1); walk <- cumsum(rnorm(200)); list(walk = walk, dw = sum(diff(walk)^2) / sum(walk^2))',
    );
    expectClose([durbinWatson(walk)], dw, near);
    expect(durbinWatson([1, -1, 1, -1])).toBe(3);
  });
});
