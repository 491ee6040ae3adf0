import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { praisWinsten } from '../../../src-main/statistics/prais-winsten.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: the same steps in base R, beside this file, on R's LakeHuron series and on the real record.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./prais-winsten.R', import.meta.url));
});
afterAll(() => r.close());

const near = { rel: 1e-9, abs: 0, why: 'two double-precision programs; rho stands still to 1e-12 in each' };

async function checkAgainstR(x: number[], y: number[], intercept: boolean): Promise<void> {
  const fit = praisWinsten({ x, y, intercept });
  const reference = await r.numbers('prais_winsten(x, y, intercept)', { x, y, intercept });
  const { coefficients, standardErrors, rho, residualStandardDeviation } = fit;
  expectClose({ coefficients, standardErrors, rho: [rho], sigma: [residualStandardDeviation] }, reference, near);
  expect(fit.degreesOfFreedom).toBe(y.length - coefficients.length);
}

describe('praisWinsten against R', () => {
  it('LakeHuron on the year, with an intercept', async () => {
    const { x = [], y = [] } = await r.numbers('list(x = as.vector(time(LakeHuron)) - 1923, y = LakeHuron)');
    await checkAgainstR(x, y, true);
  });

  it('the real record, through its first year and with an intercept', async () => {
    const { co2Ppm, temperatureK } = co2AndTemperature();
    const x = co2Ppm.map((value) => Math.log(value / (co2Ppm[0] ?? NaN)));
    const y = temperatureK.map((value) => value - (temperatureK[0] ?? NaN));
    await checkAgainstR(x, y, false);
    await checkAgainstR(x, y, true);
  });
});
