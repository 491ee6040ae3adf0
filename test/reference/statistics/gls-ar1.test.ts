import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { glsAr1, type GlsAr1Fit } from '../../../src-main/statistics/gls-ar1.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: base R with the dense covariance of the errors, beside this file, and R's own arima, on real series.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./gls-ar1.R', import.meta.url));
});
afterAll(() => r.close());

const near = {
  rel: 1e-9,
  abs: 1e-10,
  why: 'two programs at the same ρ; a small intercept is a difference of larger numbers',
};
const flat = { rel: 1e-6, abs: 0, why: 'a maximum found by its height alone is known to the root of the precision' };

const figures = ({ coefficients, standardErrors, rho, sigma, logLikelihood }: GlsAr1Fit) => ({
  coefficients,
  standardErrors,
  rho: [rho],
  sigma: [sigma],
  logLikelihood: [logLikelihood],
});

async function lakeHuron() {
  const { x = [], y = [] } = await r.numbers('list(x = as.vector(time(LakeHuron)) - 1923, y = LakeHuron - 579)');
  return { x, y };
}
const { co2Ppm, temperatureK, years } = co2AndTemperature();
const record = {
  x: co2Ppm.map((value) => Math.log(value / co2Ppm[0]!)),
  y: temperatureK.map((value) => value - temperatureK[0]!),
};

describe('glsAr1 against R', () => {
  it('ml and reml, with and without intercept: every figure at its ρ, and the ρ of the highest likelihood', async () => {
    for (const { x, y } of [await lakeHuron(), record]) {
      for (const estimator of ['ml', 'reml'] as const) {
        for (const intercept of [true, false]) {
          const fit = glsAr1({ x, y, intercept, estimator });
          const variables = { x, y, intercept, rho: fit.rho, reml: estimator === 'reml' };
          expectClose(figures(fit), await r.numbers('gls_at(x, y, intercept, rho, reml)', variables), near);
          const best = await r.numbers('gls_best(x, y, intercept, reml)', variables);
          expectClose([fit.rho], best['rho'], flat);
          expect(fit.logLikelihood).toBeGreaterThanOrEqual(best['logLikelihood']![0]! - 1e-10);
        }
      }
    }
  });

  it('missing years: the calendar distance counts, in ml and reml', async () => {
    const lake = await lakeHuron();
    const isKept = (_: number, t: number) => ![20, 21, 22, 47, 60].includes(t) && t % 9 !== 4;
    const times = lake.x.filter(isKept).map((value) => value + 1923);
    const [x, y] = [lake.x.filter(isKept), lake.y.filter(isKept)];
    for (const estimator of ['ml', 'reml'] as const) {
      for (const intercept of [true, false]) {
        const fit = glsAr1({ x, y, intercept, estimator, years: times });
        const variables = { x, y, intercept, rho: fit.rho, reml: estimator === 'reml', times };
        expectClose(figures(fit), await r.numbers('gls_at(x, y, intercept, rho, reml, times)', variables), near);
        const best = await r.numbers('gls_best(x, y, intercept, reml, times)', variables);
        expectClose([fit.rho], best['rho'], flat);
        expect(Math.abs(glsAr1({ x, y, intercept, estimator }).rho - fit.rho)).toBeGreaterThan(0.01);
      }
    }
    const consecutive = { ...record, intercept: true, estimator: 'ml' } as const;
    expect(glsAr1({ ...consecutive, years: record.x.map((_, t) => 1900 + t) })).toEqual(glsAr1(consecutive));
    expect(() => glsAr1({ ...consecutive, years: record.x.map((_, t) => 1900 - t) })).toThrow('glsAr1, years[1]');
  });

  it('two predictors', async () => {
    const x = [record.x, years.map((year) => (year - 1985) / 10)];
    const fit = glsAr1({ x, y: record.y, intercept: true, estimator: 'ml' });
    const variables = { x: x.flat(), y: record.y, intercept: true, rho: fit.rho, reml: false };
    expectClose(figures(fit), await r.numbers('gls_at(x, y, intercept, rho, reml)', variables), near);
  });

  it('ml is R’s arima(order = c(1, 0, 0)), as far as its optimiser goes', async () => {
    const { x, y } = await lakeHuron();
    const fit = glsAr1({ x, y, intercept: true, estimator: 'ml' });
    const fromR = await r.numbers(
      `fit <- arima(y, order = c(1, 0, 0), xreg = x, method = "ML", optim.control = list(reltol = 1e-14));
       list(rho = fit$coef[1], coefficients = fit$coef[2:3], sigma = sqrt(fit$sigma2), logLikelihood = fit$loglik)`,
      { x, y },
    );
    const { coefficients, rho, sigma, logLikelihood } = figures(fit);
    expectClose(
      { rho, coefficients, sigma },
      { rho: fromR['rho'], coefficients: fromR['coefficients'], sigma: fromR['sigma'] },
      {
        rel: 1e-4,
        abs: 0,
        why: 'arima stops where its numerical gradient is small',
      },
    );
    expectClose(logLikelihood, fromR['logLikelihood'], { rel: 0, abs: 1e-7, why: 'flat at the maximum' });
  });

  it('a random walk about a level: reml has no maximum below one', async () => {
    const { y = [] } = await r.numbers('list(y = 1:40 + c(0.1, -0.1, 0.05, -0.05))');
    expect(() => glsAr1({ x: y.map((_, t) => Math.cos(t)), y, intercept: true, estimator: 'reml' })).toThrow(
      'glsAr1, rho',
    );
    const { caveats } = glsAr1({ x: y.map((_, t) => Math.cos(t)), y, intercept: true, estimator: 'ml' });
    expect(caveats.map(({ code }) => code)).toContain('near-unit-root');
  });

  it('refuses an exact fit and too short a series', () => {
    const x = [1, 2, 4, 7, 8];
    expect(() => glsAr1({ x, y: x.map((v) => 3 * v), intercept: true, estimator: 'ml' })).toThrow('an exact fit');
    expect(() => glsAr1({ x: [1, 2, 3], y: [1, 3, 2], intercept: true, estimator: 'ml' })).toThrow('at least 4 rows');
  });
});
