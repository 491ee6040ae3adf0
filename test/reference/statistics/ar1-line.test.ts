import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ar1Line } from '../../../src-main/statistics/ar1-line.ts';
import { ar1LogLikelihood } from '../../../src-main/statistics/ar1-log-likelihood.ts';
import { glsAr1 } from '../../../src-main/statistics/gls-ar1.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: base R, beside this file and beside the tests of the estimators, on the real record.

let r: RSession;
beforeAll(async () => {
  const beside = (name: string) => new URL(name, import.meta.url);
  r = await startR(beside('ar1-line.R'), beside('prais-winsten.R'));
});
afterAll(() => r.close());

const near = { rel: 1e-9, abs: 0, why: 'two double-precision programs; rho stands still to 1e-12 in each' };
const { co2Ppm, temperatureK, years } = co2AndTemperature();
const x = co2Ppm.map((value) => Math.log(value / (co2Ppm[0] ?? NaN)));
const y = temperatureK.map((value) => value - (temperatureK[0] ?? NaN));

describe('ar1Line', () => {
  it('prais-winsten is that of R, with the exact likelihood of its errors', async () => {
    for (const intercept of [true, false]) {
      const { caveats, logLikelihood, ...fit } = ar1Line({ x, y, intercept, estimator: 'prais-winsten' });
      const reference = await r.numbers('prais_winsten(x, y, intercept)', { x, y, intercept });
      expectClose({ ...fit, rho: [fit.rho], sigma: [fit.sigma] }, reference, near);
      const errors = y.map((value, t) =>
        intercept
          ? value - (fit.coefficients[0] ?? NaN) - (fit.coefficients[1] ?? NaN) * (x[t] ?? NaN)
          : value - (fit.coefficients[0] ?? NaN) * (x[t] ?? NaN),
      );
      const likelihood = await r.numbers('ar1_likelihood(e, rho)', { e: errors, rho: fit.rho });
      expectClose({ logLikelihood: [logLikelihood] }, likelihood, near);
      expect(caveats).toEqual([]);
      expect(logLikelihood).toBeLessThan(ar1Line({ x, y, intercept, estimator: 'ml' }).logLikelihood);
    }
  });

  it.each(['ml', 'reml'] as const)('%s is glsAr1, in years of the calendar where they are given', (estimator) => {
    const request = { x, y, intercept: true, estimator };
    expect(ar1Line(request)).toEqual(glsAr1(request));
    expect(ar1Line({ ...request, years })).toEqual(glsAr1({ ...request, years }));
    expect(ar1Line({ ...request, years }).rho).not.toBe(ar1Line(request).rho);
  });

  // 1964 is missing in the record.
  it.each(['prais-winsten', 'cochrane-orcutt'] as const)('%s closes gaps up, and says so', async (estimator) => {
    const request = { x, y, intercept: false, estimator };
    const { caveats, logLikelihood, ...fit } = ar1Line({ ...request, years });
    const { caveats: none, logLikelihood: closedUp, ...same } = ar1Line(request);
    expect(fit).toEqual(same);
    expect(none).toEqual([]);
    expect(caveats.map(({ code }) => code)).toEqual(['gaps-closed-up']);
    // The likelihood counts the calendar, so that it can be held against that of ml.
    const e = y.map((value, t) => value - (fit.coefficients[0] ?? NaN) * (x[t] ?? NaN));
    const variables = { e, rho: fit.rho, times: years };
    const likelihood = await r.numbers('ar1_likelihood(e, rho, times)', variables);
    expectClose({ logLikelihood: [logLikelihood] }, likelihood, near);
    expect(logLikelihood).not.toBe(closedUp);
    expect(logLikelihood).toBeLessThan(ar1Line({ ...request, estimator: 'ml', years }).logLikelihood);
  });
});

describe('ar1LogLikelihood', () => {
  it('is that of the dense covariance matrix, for errors that persist and errors that alternate', async () => {
    for (const rho of [0.6, -0.4, 0]) {
      const reference = await r.numbers('ar1_likelihood(e, rho)', { e: y, rho });
      expectClose({ logLikelihood: [ar1LogLikelihood(y, rho)] }, reference, near);
    }
  });

  it('is at the ml estimate what glsAr1 says', () => {
    const fit = glsAr1({ x, y, intercept: false, estimator: 'ml' });
    const errors = y.map((value, t) => value - (fit.coefficients[0] ?? NaN) * (x[t] ?? NaN));
    expectClose(ar1LogLikelihood(errors, fit.rho), fit.logLikelihood, near);
  });

  it('refuses a random walk and errors that are all zero', () => {
    expect(() => ar1LogLikelihood(y, 1)).toThrow('ar1LogLikelihood, rho');
    expect(() => ar1LogLikelihood([0, 0, 0], 0.5)).toThrow('an exact fit');
  });
});
