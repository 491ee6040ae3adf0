import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { cochraneOrcutt } from '../../../src-main/statistics/cochrane-orcutt.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: the same steps in base R, beside this file, and R's arima, whose conditional sum of squares is the one that
// the steps make small; on R's LakeHuron series and on the real record.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./cochrane-orcutt.R', import.meta.url));
});
afterAll(() => r.close());

const near = { rel: 1e-9, abs: 0, why: 'two double-precision programs; rho stands still to 1e-12 in each' };
const { co2Ppm, temperatureK } = co2AndTemperature();
const record = {
  x: co2Ppm.map((value) => Math.log(value / (co2Ppm[0] ?? NaN))),
  y: temperatureK.map((value) => value - (temperatureK[0] ?? NaN)),
};
async function lakeHuron() {
  const { x = [], y = [] } = await r.numbers('list(x = as.vector(time(LakeHuron)) - 1923, y = LakeHuron - 579)');
  return { x, y };
}

describe('cochraneOrcutt against R', () => {
  it('the same steps, with and without an intercept', async () => {
    for (const { x, y } of [await lakeHuron(), record]) {
      for (const intercept of [true, false]) {
        const fit = cochraneOrcutt({ x, y, intercept });
        const reference = await r.numbers('cochrane_orcutt(x, y, intercept)', { x, y, intercept });
        const { coefficients, standardErrors, rho, residualStandardDeviation } = fit;
        expectClose({ coefficients, standardErrors, rho: [rho], sigma: [residualStandardDeviation] }, reference, near);
        expect(fit.degreesOfFreedom).toBe(y.length - 1 - coefficients.length);
        expect(fit.caveats).toEqual([]);
      }
    }
  });

  it('arima(method = "CSS") goes to the same valley', async () => {
    for (const { x, y } of [await lakeHuron(), record]) {
      const { coefficients, rho } = cochraneOrcutt({ x, y, intercept: true });
      const reference = await r.numbers(
        `fit <- arima(y, order = c(1, 0, 0), xreg = x, method = "CSS", optim.control = list(reltol = 1e-15));
         list(rho = coef(fit)[1], coefficients = coef(fit)[2:3])`,
        { x, y },
      );
      const flat = { rel: 1e-5, abs: 1e-6, why: 'arima stops where its numerical gradient is small' };
      expectClose({ rho: [rho], coefficients }, reference, flat);
    }
  });
});
