import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { coupledSlope } from '../../../src-main/climate/coupled-slope.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR();
});
afterAll(() => r.close());

const base = { response: 1.5, exchange: 25, sdCarbon: 0.2, sdTemperature: 0.1 };
/** Carbon and temperature in shares that matter on both sides. */
const mixed = { response: 2.1, exchange: 12, sdCarbon: 0.02, sdTemperature: 0.3 };
const exact = { rel: 1e-15, abs: 0, why: 'closed form' };

describe('coupledSlope', () => {
  it('is 1.50939624 for γ 1.5, τ 25, σ_v 0.2, σ_e 0.1 (worked by hand)', () => {
    const { slope, weightOnResponse, gain, simulated } = coupledSlope(base);
    // w = 0.04/(0.04 + 0.01/625), slope = 1.5w + 25(1 − w), gain = 1/(1 − 0.06)
    expectClose(slope, 1.50939624, { rel: 0, abs: 5e-9, why: 'worked to eight decimals' });
    expectClose(weightOnResponse, 0.04 / 0.040016, exact);
    expectClose(gain, 1 / 0.94, exact);
    expect(simulated).toBeNull();
  });

  it('goes to the response without noise in temperature, to the exchange without any in carbon', () => {
    expect(coupledSlope({ ...mixed, sdTemperature: 0 }).slope).toBe(2.1);
    expect(coupledSlope({ ...mixed, sdCarbon: 0 }).slope).toBe(12);
    expectClose(coupledSlope({ ...mixed, sdTemperature: 1e-9 }).slope, 2.1, { rel: 1e-10, abs: 0, why: 'limit' });
    expectClose(coupledSlope({ ...mixed, sdCarbon: 1e-9 }).slope, 12, { rel: 1e-10, abs: 0, why: 'limit' });
    expect(coupledSlope({ ...mixed, sdCarbon: 0 }).caveats.map(({ code }) => code)).toEqual(['not-driven-by-carbon']);
    expect(coupledSlope(base).caveats).toEqual([]);
  });

  it.each([base, mixed])('its own simulation agrees within 4.5 standard errors', (input) => {
    const draws = 200_000;
    const { slope, simulated } = coupledSlope({ ...input, simulation: { draws, seed: 3 } });
    const { slope: found, standardError } = simulated!;
    expectClose(found, slope, { rel: 0, abs: 4.5 * standardError, why: 'Monte Carlo error of the draws' });
    // The error itself, from the residual variance of T on x: σ_e² σ_v² (1 − γ/τ)² gain² over (n var x).
    const { response, exchange, sdCarbon, sdTemperature } = input;
    const variance = sdCarbon ** 2 + (sdTemperature / exchange) ** 2;
    const residual = (sdTemperature * sdCarbon) ** 2 / variance;
    const gain = 1 / (1 - response / exchange);
    const expected = Math.sqrt(residual / (gain ** 2 * variance) / draws);
    // sd of a standard error is about itself/√(2n).
    const share = 4.5 / Math.sqrt(2 * draws) + 4.5 / Math.sqrt(2 * draws);
    expectClose(standardError, expected, { rel: share, abs: 0, why: 'scatter of two variances' });
  });

  it('R’s lm on draws of R, solved round by round, agrees within 4.5 standard errors', async () => {
    for (const input of [base, mixed]) {
      // The loop is run until it stands still instead of being solved: an independent way to the same system.
      const { fit } = await r.numbers(
        `set.seed(7); n <- 40000; e <- rnorm(n, 0, sdTemperature); v <- rnorm(n, 0, sdCarbon); T <- rep(0, n)
         for (i in 1:200) { x <- T / exchange + v; T <- response * x + e }
         list(fit = summary(lm(T ~ x))$coefficients["x", 1:2])`,
        input,
      );
      const [slope = NaN, standardError = NaN] = fit ?? [];
      const bound = { rel: 0, abs: 4.5 * standardError, why: 'Monte Carlo error of R’s draws' };
      expectClose(coupledSlope(input).slope, slope, bound);
    }
  });

  it('draws the same digits for a seed, in blocks that report', () => {
    const shares: number[] = [];
    const simulation = { draws: 150_000, seed: 9 };
    const first = coupledSlope({ ...mixed, simulation }, (share) => shares.push(share));
    expect(coupledSlope({ ...mixed, simulation })).toEqual(first);
    expect(coupledSlope({ ...mixed, simulation: { ...simulation, seed: 10 } }).simulated).not.toEqual(first.simulated);
    expect(shares).toEqual([65_536 / 150_000, 131_072 / 150_000, 1]);
    expect(first.simulated?.random).toMatchObject({ seed: 9, nDraws: 150_000 });
  });

  it.each([
    [{ response: 25 }, 'γ/τ = 1.00'],
    [{ response: 40 }, 'γ/τ = 1.60'],
    [{ exchange: 0 }, 'exchange'],
    [{ response: -1 }, 'response'],
    [{ sdCarbon: -0.1 }, 'sdCarbon'],
    [{ sdTemperature: NaN }, 'sdTemperature'],
    [{ sdCarbon: 0, sdTemperature: 0 }, 'one of the two standard deviations above 0'],
  ])('refuses %o', (change, words) => {
    expect(() => coupledSlope({ ...base, ...change })).toThrow(words);
  });
});
