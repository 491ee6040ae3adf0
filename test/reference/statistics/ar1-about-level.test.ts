import { afterAll, beforeAll, expect, it } from 'vitest';
import { ar1AboutLevel } from '../../../src-main/statistics/ar1-about-level.ts';
import { glsAr1 } from '../../../src-main/statistics/gls-ar1.ts';
import { yearSteps } from '../../../src-main/statistics/year-steps.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

// Level B: R's arima on R's LakeHuron; arima takes missing years as such, by its Kalman filter.

let r: RSession;
beforeAll(async () => {
  r = await startR();
});
afterAll(() => r.close());

const level = 579;
const optimised = { rel: 2e-4, abs: 0, why: 'arima stops where its numerical gradient is small' };
const flat = { rel: 0, abs: 1e-6, why: 'flat at the maximum' };

it.each([
  ['all years', () => true],
  ['with gaps of two and three years', (t: number) => ![20, 21, 47, 60].includes(t) && t % 9 !== 4],
] as const)('ar1AboutLevel is R’s arima, level fitted and not: %s', async (_, isKept) => {
  const { lake = [] } = await r.numbers('list(lake = as.vector(LakeHuron))');
  const years = lake.flatMap((_value, t) => (isKept(t) ? [1875 + t] : []));
  const values = Float64Array.from(years, (year) => lake[year - 1875]!);
  const steps = yearSteps('test', years, years.length);
  for (const hasLevel of [true, false]) {
    const errors = hasLevel ? values : values.map((value) => value - level);
    const found = ar1AboutLevel(errors, steps, hasLevel);
    const fromR = await r.numbers(
      `y <- as.vector(LakeHuron) - (if (mean) 0 else ${level}); y[-kept] <- NA
       fit <- arima(y, c(1, 0, 0), include.mean = mean, method = "ML", optim.control = list(reltol = 1e-14))
       list(rho = fit$coef[1], level = if (mean) fit$coef[2] else 0, sigma = sqrt(fit$sigma2), logLik = fit$loglik)`,
      { kept: years.map((year) => year - 1874), mean: hasLevel },
    );
    const { rho, sigma, level: mean, logLikelihood } = found;
    expectClose(
      { rho: [rho], level: [mean], sigma: [sigma] },
      { rho: fromR['rho'], level: fromR['level'], sigma: fromR['sigma'] },
      optimised,
    );
    expectClose([logLikelihood], fromR['logLik'], flat);
    if (!hasLevel) continue;
    const line = glsAr1({ x: [values.map(() => 1)], y: values, intercept: false, estimator: 'ml', years });
    expectClose([rho, mean], [line.rho, line.coefficients[0]!], {
      rel: 1e-7,
      abs: 0,
      why: 'flat: root of the precision',
    });
    expectClose(logLikelihood, line.logLikelihood, { rel: 1e-12, abs: 0, why: 'the same likelihood, other sums' });
  }
});

it('ar1AboutLevel of errors without scatter is unbounded', () => {
  const same = new Float64Array(5).fill(2);
  expect(ar1AboutLevel(same, new Float64Array(5).fill(1), true)).toMatchObject({ sigma: 0, logLikelihood: Infinity });
});
