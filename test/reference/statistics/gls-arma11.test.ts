import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { arma11Likelihood } from '../../../src-main/statistics/arma11-likelihood.ts';
import { glsArma11, type GlsArma11Fit } from '../../../src-main/statistics/gls-arma11.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: base R with the dense covariance of the errors, beside this file, and R's own arima, on real series.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./gls-arma11.R', import.meta.url));
});
afterAll(() => r.close());

const near = {
  rel: 1e-9,
  abs: 1e-10,
  why: 'two programs at the same φ and θ; a small intercept is a difference of larger numbers',
};
const sameHeight = { rel: 0, abs: 1e-6, why: 'flat at the maximum: arima’s place may differ, its height hardly' };

const figures = ({ coefficients, standardErrors, sigma, logLikelihood }: GlsArma11Fit) => ({
  coefficients,
  standardErrors,
  sigma: [sigma],
  logLikelihood: [logLikelihood],
});
const codes = ({ caveats }: GlsArma11Fit) => caveats.map(({ code }) => code);

async function lakeHuron() {
  const { x = [], y = [] } = await r.numbers('list(x = as.vector(time(LakeHuron)) - 1923, y = LakeHuron - 579)');
  return { x, y, years: x.map((value) => value + 1923) };
}
const { co2Ppm, temperatureK, years } = co2AndTemperature();
const record = {
  x: co2Ppm.map((value) => Math.log(value / co2Ppm[0]!)),
  y: temperatureK.map((value) => value - temperatureK[0]!),
  years,
};

describe('glsArma11 against R', () => {
  it('LakeHuron, with and without intercept: every figure at its φ and θ, and arima’s maximum', async () => {
    const { x, y, years: times } = await lakeHuron();
    for (const intercept of [true, false]) {
      const fit = glsArma11({ x, y, intercept });
      const variables = { x, y, intercept, times, phi: fit.phi, theta: fit.theta };
      expectClose(figures(fit), await r.numbers('gls_arma11_at(x, y, intercept, phi, theta, times)', variables), near);
      const best = await r.numbers('arima11_best(x, y, intercept, times)', variables);
      expectClose([fit.logLikelihood], best['logLikelihood'], sameHeight);
      expect(fit.logLikelihood).toBeGreaterThanOrEqual(best['logLikelihood']![0]! - 1e-9);
      const { coefficients, sigma } = figures(fit);
      expectClose(
        { phi: [fit.phi], theta: [fit.theta], coefficients, sigma },
        { phi: best['phi'], theta: best['theta'], coefficients: best['coefficients'], sigma: best['sigma'] },
        {
          rel: 2e-4,
          abs: 2e-4,
          why: 'height 1e-6 below the top allows φ and θ to be 1e-4 off, at curvatures near 100',
        },
      );
      expect(fit.caveats).toEqual([]);
    }
  });

  it('the real record: arima’s maximum, beside which there are others nearly as high', async () => {
    const { x, y } = record;
    const fit = glsArma11({ ...record, intercept: true });
    const variables = { x, y, intercept: true, times: years, phi: fit.phi, theta: fit.theta };
    expectClose(figures(fit), await r.numbers('gls_arma11_at(x, y, intercept, phi, theta, times)', variables), near);
    const best = await r.numbers('arima11_best(x, y, intercept, times)', variables);
    expectClose([fit.logLikelihood], best['logLikelihood'], sameHeight);
    expect(codes(fit)).toEqual(['near-cancelling-roots', 'several-maxima']);
    // What the caveat says of the other ones, from the dense covariance matrix there.
    const pattern =
      /lower by ([\d.]+) at a maximum at φ = (-?[\d.]+), θ = (-?[\d.]+), where the last coefficient is (-?\d+\.\d+)/g;
    const others = [...(fit.caveats[1]?.detail ?? '').matchAll(pattern)].map((found) => found.slice(1).map(Number));
    expect(others).toHaveLength(1);
    expect(fit.caveats[1]?.detail).toContain('and still rising at φ = -1.000');
    for (const [drop, phi = NaN, theta = NaN, slope] of others) {
      const there = await r.numbers('gls_arma11_at(x, y, intercept, phi, theta, times)', { ...variables, phi, theta });
      expectClose([fit.logLikelihood - there['logLikelihood']![0]!, there['coefficients']![1]!], [drop, slope], {
        rel: 1e-4,
        abs: 0.006,
        why: 'printed to two decimals, at φ and θ of three',
      });
    }
  });

  it('the real record through its first year: the likelihood rises up to φ = 1, and the answer says so', async () => {
    const { x, y } = record;
    const fit = glsArma11({ ...record, intercept: false });
    expect(codes(fit)).toEqual(['no-maximum', 'near-noninvertible', 'several-maxima']);
    const heights = await Promise.all(
      [0.9, 0.99, 0.999, 0.9999].map(async (phi) => {
        const variables = { x, y, intercept: false, times: years, theta: fit.theta, phi };
        return (await r.numbers('gls_arma11_at(x, y, intercept, phi, theta, times)', variables))['logLikelihood']![0]!;
      }),
    );
    expect(heights.toSorted((a, b) => a - b)).toEqual(heights);
    expect(fit.logLikelihood).toBeGreaterThan(heights.at(-1)!);
    const arima = await r.numbers('arima11_best(x, y, intercept, times)', { x, y, intercept: false, times: years });
    expect(fit.logLikelihood).toBeGreaterThanOrEqual(arima['logLikelihood']![0]! - 1e-9);
  });

  it('two predictors', async () => {
    const x = [record.x, years.map((year) => Math.sin(year / 4))];
    const fit = glsArma11({ x, y: record.y, intercept: true, years });
    const variables = { x: x.flat(), y: record.y, intercept: true, times: years, phi: fit.phi, theta: fit.theta };
    expectClose(figures(fit), await r.numbers('gls_arma11_at(x, y, intercept, phi, theta, times)', variables), near);
  });

  it('missing years are predicted across, not closed up', async () => {
    const lake = await lakeHuron();
    const isKept = (_: number, t: number) => ![20, 21, 22, 47, 60].includes(t) && t % 9 !== 4;
    const [x, y, times] = [lake.x.filter(isKept), lake.y.filter(isKept), lake.years.filter(isKept)];
    const fit = glsArma11({ x, y, intercept: true, years: times });
    const variables = { x, y, intercept: true, times, phi: fit.phi, theta: fit.theta };
    expectClose(figures(fit), await r.numbers('gls_arma11_at(x, y, intercept, phi, theta, times)', variables), near);
    const best = await r.numbers('arima11_best(x, y, intercept, times)', variables);
    expectClose([fit.logLikelihood], best['logLikelihood'], sameHeight);
    const closedUp = glsArma11({ x, y, intercept: true });
    expect(Math.abs(closedUp.phi - fit.phi)).toBeGreaterThan(0.01);
    expect(glsArma11({ ...lake, intercept: true })).toEqual(glsArma11({ x: lake.x, y: lake.y, intercept: true }));
  });

  it('the likelihood away from its maximum, for errors that alternate and at |θ| = 1', async () => {
    const { x, y, years: times } = await lakeHuron();
    const likelihood = arma11Likelihood(
      [new Float64Array(y.length).fill(1), Float64Array.from(x)],
      Float64Array.from(y),
      new Float64Array(y.length).fill(1),
    );
    for (const [phi, theta] of [
      [0.6, -0.4],
      [-0.7, 0.2],
      [0.3, 1],
      [-0.4, -1],
    ] as const) {
      const variables = { x, y, intercept: true, times, phi, theta };
      const { logLikelihood } = await r.numbers('gls_arma11_at(x, y, intercept, phi, theta, times)', variables);
      expectClose([likelihood(phi, theta).logLikelihood], logLikelihood, near);
    }
  });
});
