import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, expectTypeOf, it } from 'vitest';
import { henryCo2, henrySolubility } from '../../../src-main/climate/seawater/henry-solubility.ts';
import { humphreys2024 } from '../../../src-main/climate/seawater/humphreys2024.ts';
import { takahashi1993 } from '../../../src-main/climate/seawater/takahashi1993.ts';
import { weiss1974 } from '../../../src-main/climate/seawater/weiss1974.ts';
import { gasConstant } from '../../../src-main/quantities/solubility-units.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR();
});
afterAll(() => r.close());

const printed = (digits: number) => ({
  rel: 0,
  abs: 0.5 * 10 ** -digits,
  why: 'half a unit of the last printed digit',
});
const near = { rel: 1e-12, abs: 0, why: 'the same closed form in two double-precision programs' };

describe('weiss1974', () => {
  // Level A, second-hand: ln K0 = −3.5617 and pK0 = 1.5468 are the usual check of handbooks of seawater chemistry,
  // 0.03515 is from Weiss's Table III.
  it('published: ln K0 −3.5617 at 25 °C and S 35, 0.03515 at 20 °C and S 20', () => {
    const usual = weiss1974(25, 35);
    expectClose(Math.log(usual.solubilityMolPerKgAtm), -3.5617, printed(4));
    expectClose(-Math.log10(usual.solubilityMolPerKgAtm), 1.5468, printed(4));
    expectClose(weiss1974(20, 20).solubilityMolPerKgAtm, 0.03515, printed(5));
  });

  // Level B: computed independently of this project.
  it.each([
    [25, 35, 0.02839188, 0.02905893],
    [25, 0, 0.03406104, 0.03396652],
    [20, 20, 0.03514658, null],
    [15, 35, 0.03745922, null],
    [0, 35, 0.06287012, null],
    [20, 35, 0.03240744, null],
  ])('computed elsewhere: %s °C, S %s', (temperatureC, salinity, perKg, perLitre) => {
    const { solubilityMolPerKgAtm, solubilityMolPerLAtm } = weiss1974(temperatureC, salinity);
    expectClose(solubilityMolPerKgAtm, perKg, printed(8));
    if (perLitre !== null) expectClose(solubilityMolPerLAtm, perLitre, printed(8));
  });

  it('computed elsewhere: ln K0 = −3.561652, slopes and d ln K0/d(1/T)', () => {
    expectClose(Math.log(weiss1974(25, 35).solubilityMolPerKgAtm), -3.561652, printed(6));
    const slopes = [25, 15, 0].map((temperatureC) => -weiss1974(temperatureC, 35).dLnSolubilityPerK);
    expectClose(slopes, [0.02525, 0.03028, 0.03902], printed(5));
    const perReciprocal = (temperatureC: number, salinity: number) =>
      -weiss1974(temperatureC, salinity).dLnSolubilityPerK * (temperatureC + 273.15) ** 2;
    const found = [perReciprocal(25, 35), perReciprocal(15, 35), perReciprocal(0, 35)];
    expectClose(found, [2244, 2514, 2912], printed(0));
    expectClose([perReciprocal(25, 0), perReciprocal(15, 0)], [2381, 2614], printed(0));
  });

  it('R: the slope is the derivative that R finds by its own rules, and the solubility is R’s', async () => {
    const formula = `K <- quote(a1 + a2 * (100 / t) + a3 * log(t / 100) + s * (b1 + b2 * (t / 100) + b3 * (t / 100)^2))
      list(perKg = exp(eval(K)), slope = eval(D(K, 't')))`;
    const perKg = { a1: -60.2409, a2: 93.4517, a3: 23.3585, b1: 0.023517, b2: -0.023656, b3: 0.0047036 };
    const perLitre = { a1: -58.0931, a2: 90.5069, a3: 22.294, b1: 0.027766, b2: -0.025888, b3: 0.0050578 };
    for (const [temperatureC, salinity] of [
      [-1, 40],
      [8.5, 0],
      [31, 37.5],
    ] as const) {
      const at = { t: temperatureC + 273.15, s: salinity };
      const found = weiss1974(temperatureC, salinity);
      const kg = await r.numbers(formula, { ...perKg, ...at });
      const litre = await r.numbers(formula, { ...perLitre, ...at });
      const ofSum = { rel: 1e-11, abs: 0, why: 'terms of 100 that cancel to 1' };
      expectClose([found.solubilityMolPerKgAtm], kg['perKg'], ofSum);
      expectClose([found.solubilityMolPerLAtm], litre['perKg'], ofSum);
      expectClose([found.dLnSolubilityPerK], kg['slope'], ofSum);
    }
  });

  it('the two forms differ by the density of seawater: 2.35 % at 25 °C and S 35, and have types that do not mix', () => {
    const { solubilityMolPerKgAtm, solubilityMolPerLAtm } = weiss1974(25, 35);
    expectClose(100 * (solubilityMolPerLAtm / solubilityMolPerKgAtm - 1), 2.35, printed(2));
    // Density of seawater 1.02334 kg/L and of pure water 0.99705 at 25 °C: common knowledge of the trade, from memory.
    const fits = { rel: 5e-4, abs: 0, why: 'two fits to the same measurements' };
    expectClose(solubilityMolPerLAtm / solubilityMolPerKgAtm, 1.02334, fits);
    const fresh = weiss1974(25, 0);
    expectClose(fresh.solubilityMolPerLAtm / fresh.solubilityMolPerKgAtm, 0.99705, fits);
    expectTypeOf(solubilityMolPerKgAtm).not.toExtend<typeof solubilityMolPerLAtm>();
    expectTypeOf(solubilityMolPerLAtm).not.toExtend<typeof solubilityMolPerKgAtm>();
  });
});

describe('henrySolubility', () => {
  // Level A, second-hand: one value in the units in which the compilation and older tables give it.
  it('published: 3.3e-4 mol m⁻³ Pa⁻¹ is 0.033437 mol L⁻¹ atm⁻¹ and 0.81806 water over air; −19.95 kJ/mol', () => {
    const at25 = henrySolubility(25);
    expectClose(at25.solubilityMolPerM3Pa, 3.3e-4, near);
    expectClose(at25.solubilityMolPerLAtm, 0.033437, printed(6));
    expectClose(at25.solubilityWaterAir, 0.81806, printed(5));
    expectClose((-henryCo2.vantHoffK * gasConstant) / 1000, -19.95, printed(2));
  });

  it('near Weiss 1974 in pure water, per litre with per litre', () => {
    const rounded = { rel: 0.02, abs: 0, why: 'the compilation rounds to two digits' };
    expectClose(henrySolubility(25).solubilityMolPerLAtm, weiss1974(25, 0).solubilityMolPerLAtm, rounded);
  });

  it('by hand: ln H is straight in 1/T with slope B, for CO2 and for other constants', () => {
    for (const constant of [henryCo2, { solubilityMolPerM3Pa: 1.3e-5, vantHoffK: 1500 }]) {
      const [cold, warm] = [henrySolubility(2, constant), henrySolubility(40, constant)];
      const rise = Math.log(cold.solubilityMolPerM3Pa / warm.solubilityMolPerM3Pa);
      expectClose(rise / (1 / 275.15 - 1 / 313.15), constant.vantHoffK, near);
      expectClose(cold.dLnSolubilityPerK, -constant.vantHoffK / 275.15 ** 2, near);
    }
  });
});

describe('isochemical effect', () => {
  const points = readFileSync(new URL('./takahashi1993.csv', import.meta.url), 'utf8')
    .trim()
    .split('\n')
    .filter((line) => !/^[#a-z]/.test(line))
    .map((line) => line.split(',').map(Number));
  const temperatureC = points.map(([value = NaN]) => value);
  const pco2 = points.map(([, value = NaN]) => value);

  it('R: lm on the eight points of Table A1 gives what takahashi1993 rounds to', async () => {
    expect(points).toHaveLength(8);
    const fit = await r.numbers(
      `fit <- lm(log(p) ~ t); bent <- coef(lm(log(p) ~ t + I(t^2)))
       list(slope = coef(summary(fit))['t', 1:2], bent = bent[2:3])`,
      { t: temperatureC, p: pco2 },
    );
    // Computed elsewhere from the same points: which says that they are the same points.
    expectClose(fit['slope'], [0.0421803, 0.0001682], printed(7));
    expectClose(fit['bent']?.[0], 0.0433145, printed(7));
    expectClose(fit['bent']?.[1], -4.33156e-5, printed(10));
    const within = (nErrors: number) => ({ rel: 0, abs: nErrors * 0.0001682, why: 'standard errors of the refit' });
    expectClose(takahashi1993(15, 'linear'), fit['slope']?.[0], within(1));
    for (const t of [2.1, 15, 24.5]) {
      const [linear = NaN, square = NaN] = fit['bent'] ?? [];
      const half = { rel: 0, abs: 0.5e-4 + 0.5e-6 * 2 * t, why: 'half a unit of the last digit of each coefficient' };
      expectClose(takahashi1993(t, 'quadratic'), linear + 2 * square * t, half);
    }
  });

  it('R: lm in 1/T gives B = 3451.02 K; Humphreys’ fitted 28 995 J/mol lies within 1.1 % of it', async () => {
    const fit = await r.numbers(
      `list(log = -coef(lm(log(p) ~ I(1 / (t + 273.15))))[2],
            direct = coef(nls(p ~ exp(a - b / (t + 273.15)), start = list(a = 18, b = 3451)))['b'])`,
      { t: temperatureC, p: pco2 },
    );
    expectClose(fit['log'], [3451.02], printed(2));
    const b = (coefficient: 'fit' | 'enthalpy') => humphreys2024(15, coefficient) * 288.15 ** 2 * gasConstant;
    expectClose(b('fit'), 28_995, near);
    expectClose(b('enthalpy'), 25_288, near);
    const other = { rel: 0.011, abs: 0, why: 'fitted to fCO2 or pCO2 itself, which of the two is not on record here' };
    expectClose(b('fit') / gasConstant, fit['log']?.[0], other);
    expectClose(b('fit') / gasConstant, fit['direct']?.[0], { ...other, rel: 0.002 });
  });

  it('by hand: the quadratic has 0.041995 at 15 °C; van ’t Hoff’s form falls with 1/T²', () => {
    expectClose(takahashi1993(15, 'quadratic'), 0.041995, near);
    expect(takahashi1993(3, 'linear')).toBe(0.0423);
    expectClose(humphreys2024(0, 'fit') / humphreys2024(30, 'fit'), (303.15 / 273.15) ** 2, near);
  });
});
