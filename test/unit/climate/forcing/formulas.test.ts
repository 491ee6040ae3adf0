import { describe, expect, it } from 'vitest';
import { bandOverlap } from '../../../../src-main/climate/forcing/band-overlap.ts';
import { forcingFormulas } from '../../../../src-main/climate/forcing/forcing-formulas.ts';
import {
  meinshausen2020,
  meinshausenBase,
  meinshausenAlpha,
  meinshausenTopPpm,
} from '../../../../src-main/climate/forcing/meinshausen2020.ts';
import { overlappedRoots } from '../../../../src-main/climate/forcing/overlapped-roots.ts';
import { forcingFormula } from '../../../../src-main/contract/forcing.ts';
import { expectClose } from '../../../helpers/close.ts';

const rounding = { rel: 1e-13, abs: 1e-15, why: 'rounding' };
const year2019 = { co2Ppm: 409.9, ch4Ppb: 1866.3, n2oPpb: 332.1 };

describe.each(forcingFormula.options)('%s', (name) => {
  const formula = forcingFormulas[name];

  it('gives exactly nothing at its reference: not the ln(1 + C/C0) of an early public code', () => {
    for (const reference of [meinshausenBase, year2019, { co2Ppm: 180, ch4Ppb: 340, n2oPpb: 200 }]) {
      const { co2Wm2, ch4Wm2, n2oWm2 } = formula(reference, reference);
      expect([co2Wm2, ch4Wm2, n2oWm2].map(Math.abs)).toEqual([0, 0, 0]);
    }
  });

  it('gives nothing for a gas that stays where it is while the others change', () => {
    for (const gas of ['co2', 'ch4', 'n2o'] as const) {
      const key = gas === 'co2' ? 'co2Ppm' : (`${gas}Ppb` as const);
      expect(formula({ ...year2019, [key]: meinshausenBase[key] }, meinshausenBase)[`${gas}Wm2`]).toBe(0);
    }
  });

  it('takes the natural logarithm: log10 would be 2.302585 times smaller', () => {
    const { co2Wm2 } = formula({ ...meinshausenBase, co2Ppm: 10 * 277.15 }, meinshausenBase);
    expect(co2Wm2).toBeGreaterThan(12);
  });
});

describe('overlappedRoots', () => {
  it('subtracts from each gas what it shares with the other’s reference', () => {
    const [now, from] = [
      { co2Ppm: 560, ch4Ppb: 1600, n2oPpb: 324 },
      { co2Ppm: 280, ch4Ppb: 900, n2oPpb: 289 },
    ];
    const { co2Wm2, ch4Wm2, n2oWm2 } = overlappedRoots(now, from, { co2: 2, ch4: 0.1, n2o: 0.2 });
    expectClose(co2Wm2, 2 * Math.LN2, rounding);
    expectClose(ch4Wm2, 0.1 * (40 - 30) - bandOverlap(1600, 289) + bandOverlap(900, 289), rounding);
    expectClose(n2oWm2, 0.2 * (18 - 17) - bandOverlap(900, 324) + bandOverlap(900, 289), rounding);
  });
});

describe('bandOverlap', () => {
  it('is written out', () => {
    // (MN)^0.75 = 10⁶^0.75 = 31 622.78; (MN)^1.52 = 10^9.12.
    const expected = 0.47 * Math.log(1 + 2.01e-5 * 10 ** 4.5 + 5.31e-15 * 1000 * 10 ** 9.12);
    expectClose(bandOverlap(1000, 1000), expected, rounding);
  });
});

describe('the CO2 coefficient of Meinshausen et al. 2020', () => {
  const base = 277.15;
  const top = meinshausenTopPpm(base);

  it('is held from 1808.439086 ppm on, at 5.829970147', () => {
    expectClose(top, 1808.439086, { rel: 0, abs: 5e-7, why: 'six printed decimals' });
    for (const ppm of [top + 1e-9, 2500, 8000]) {
      expectClose(meinshausenAlpha(ppm, base), 5.829970147, { rel: 0, abs: 5e-10, why: 'nine decimals' });
    }
  });

  it('is 5.2488 up to the reference, and continuous at both joints', () => {
    expect([100, base].map((ppm) => meinshausenAlpha(ppm, base))).toEqual([5.2488, 5.2488]);
    expectClose(meinshausenAlpha(base * (1 + 1e-12), base), 5.2488, {
      rel: 1e-9,
      abs: 0,
      why: 'a step of it',
    });
    expectClose(meinshausenAlpha(top, base), meinshausenAlpha(top + 1, base), rounding);
  });

  it('follows the reference, and differs from a fixed 277.15 ppm', () => {
    expect(meinshausenAlpha(600, 300)).toBe(meinshausenAlpha(577.15, base));
    expect(meinshausenAlpha(600, 300)).not.toBe(meinshausenAlpha(600, base));
  });
});

describe('meinshausen2020', () => {
  it('puts current concentrations into its brackets: their means, as in Etminan et al. 2016, would be another number', () => {
    const { ch4Wm2 } = meinshausen2020(year2019, meinshausenBase);
    const bracket = (m: number, n: number): number => -8.9603e-5 * Math.sqrt(m) - 1.2462e-4 * Math.sqrt(n) + 0.045194;
    const roots = Math.sqrt(1866.3) - Math.sqrt(731.41);
    expectClose(ch4Wm2, bracket(1866.3, 332.1) * roots, rounding);
    expect(Math.abs(ch4Wm2 - bracket((1866.3 + 731.41) / 2, (332.1 + 273.87) / 2) * roots)).toBeGreaterThan(0.01);
  });
});
