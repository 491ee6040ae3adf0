import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { attenuation } from '../../../src-main/statistics/attenuation.ts';
import { deming } from '../../../src-main/statistics/deming.ts';
import { york } from '../../../src-main/statistics/york.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./deming.R', import.meta.url));
});
afterAll(() => r.close());

// Pearson 1901, Phil. Mag. 2, 559–572.
const x = [0, 0.9, 1.8, 2.6, 3.3, 4.4, 5.2, 6.1, 6.5, 7.4];
const y = [5.9, 5.4, 4.4, 4.6, 3.5, 3.7, 2.8, 2.8, 2.4, 1.5];
const printed = (digits: number) => ({
  rel: 0,
  abs: 0.5 * 10 ** -digits,
  why: 'half a unit of the last printed digit',
});
const near = { rel: 1e-9, abs: 0, why: 'two double-precision programs, by different formulas' };

describe('deming', () => {
  // Level A: Pearson's own line of closest fit, y = 5.784 − 0.546 x; more digits, and other δ, computed independently of
  // this project.
  it('Pearson’s line', () => {
    const major = deming({ x, y, delta: 1 });
    expectClose([major.slope, major.intercept], [-0.546, 5.784], printed(3));
    expectClose([major.intercept, major.slope], [5.7840437745, -0.5455611975], printed(10));
    expectClose([major.interceptStandardError, major.slopeStandardError], [0.16309, 0.0368], printed(5));
    const flat = deming({ x, y, delta: 4 });
    expectClose([flat.intercept, flat.slope], [5.7680256745, -0.5413679776], printed(10));
    const steep = deming({ x, y, delta: 0.25 });
    expectClose([steep.intercept, steep.slope], [5.8159154032, -0.5539045558], printed(10));
  });

  // Level B: base R, by eigenvectors and refits.
  it('R: δ of a quarter, one and nine, on Pearson’s data and the real record', async () => {
    const { co2Ppm, temperatureK } = co2AndTemperature();
    const record = { x: co2Ppm.map((value) => Math.log(value / 300)), y: temperatureK };
    for (const data of [{ x, y }, record, { x: record.y, y: record.x }]) {
      for (const delta of [0.25, 1, 9]) {
        const { caveats, ...fit } = deming({ ...data, delta });
        const fromR = await r.numbers('deming_jackknife(x, y, delta)', { ...data, delta });
        expectClose(Object.fromEntries(Object.entries(fit).map(([name, value]) => [name, [value]])), fromR, near);
        expect(caveats).toEqual([]);
      }
    }
  });

  // Level C: York's line for constant errors.
  it('is york’s for errors of one size', () => {
    for (const delta of [0.25, 4]) {
      const fit = york({ x, y, sx: 0.3, sy: 0.3 * Math.sqrt(delta) });
      const { slope, intercept } = deming({ x, y, delta });
      expectClose([slope, intercept], [fit.slope, fit.intercept], { ...near, rel: 1e-11 });
    }
  });
});

describe('attenuation', () => {
  // Level A: the two regressions of Pearson's data, computed independently of this project; the corrected slope by hand.
  it('Pearson’s data', () => {
    const found = attenuation({ x, y, xErrorStandardDeviation: 0.5 });
    expectClose(found.bounds.direct, -0.53957727, printed(8));
    expectClose(found.bounds.reverse, -0.56588893, printed(8));
    const mean = x.reduce((sum, value) => sum + value, 0) / 10;
    const variance = x.reduce((sum, value) => sum + (value - mean) ** 2, 0) / 9;
    expectClose(found.reliability, 1 - 0.25 / variance, { ...near, rel: 1e-12 });
    expectClose(found.correctedSlope, -0.53957727 / (1 - 0.25 / variance), { ...near, rel: 1e-7 });
    expect(attenuation({ x, y, xErrorStandardDeviation: 0 })).toMatchObject({ reliability: 1, slope: found.slope });
  });

  // Level C: errors exactly uncorrelated with the true x in the sample, of exactly the stated variance.
  it('gives the true slope back', () => {
    const truth = [-3, -1, 1, 3, -3, -1, 1, 3];
    for (const size of [0.7, 2.5]) {
      const observed = truth.map((value, i) => value + (i < 4 ? size : -size));
      const sd = size * Math.sqrt(8 / 7);
      const response = truth.map((value) => 1.5 * value);
      const { reliability, slope, correctedSlope, bounds, caveats } = attenuation({
        x: observed,
        y: response,
        xErrorStandardDeviation: sd,
      });
      expectClose(reliability, 5 / (5 + size ** 2), { ...near, rel: 1e-12 });
      expectClose(correctedSlope, 1.5, { ...near, rel: 1e-12 });
      // y without errors: x on y turned round is exact.
      expectClose(bounds, { direct: slope, reverse: 1.5 }, { ...near, rel: 1e-12 });
      expect(caveats.map(({ code }) => code)).toEqual(size > 2 ? ['low-reliability'] : []);
    }
  });
});
