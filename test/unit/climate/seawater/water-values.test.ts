import { describe, expect, it } from 'vitest';
import { henrySolubility } from '../../../../src-main/climate/seawater/henry-solubility.ts';
import { humphreys2024 } from '../../../../src-main/climate/seawater/humphreys2024.ts';
import { takahashi1993 } from '../../../../src-main/climate/seawater/takahashi1993.ts';
import { waterSalinity, waterTemperatureC } from '../../../../src-main/climate/seawater/water-values.ts';
import { weiss1974 } from '../../../../src-main/climate/seawater/weiss1974.ts';
import { InputError } from '../../../../src-main/errors.ts';

function errorOf(run: () => unknown): InputError['fields'] {
  try {
    run();
  } catch (error) {
    if (error instanceof InputError) return error.fields;
  }
  throw new Error('no InputError');
}

describe('waterTemperatureC', () => {
  it.each([-5, -1.9, 0, 25, 60])('takes %s °C', (value) => {
    expect(waterTemperatureC('test', 't', value)).toBe(value);
  });

  it.each([
    [298.15, 'looks like kelvin: 298.15 K are 25.0 °C'],
    [271.15, '−2.0 °C'],
    [77, 'looks like degrees Fahrenheit: 77 °F are 25.0 °C'],
    [60.1, 'Fahrenheit'],
    [-5.1, 'freezes'],
    [-40, 'freezes'],
    [1500, 'in °C'],
  ])('refuses %s and says what it looks like', (value, words) => {
    const { code, where, received, hint } = errorOf(() => waterTemperatureC('test', 't', value));
    expect([code, where, received]).toEqual(['suspected-unit', 'test, t', String(value)]);
    expect(hint).toContain(words);
  });

  it.each([NaN, Infinity])('refuses %s', (value) => {
    expect(errorOf(() => waterTemperatureC('test', 't', value)).code).toBe('out-of-range');
  });

  it('stands at the door of every law', () => {
    const laws = [
      () => weiss1974(298.15, 35),
      () => henrySolubility(298.15),
      () => takahashi1993(298.15, 'linear'),
      () => humphreys2024(298.15, 'fit'),
    ];
    for (const law of laws) expect(errorOf(law).code).toBe('suspected-unit');
  });
});

it('waterSalinity takes 0 to 50 g/kg and refuses the rest', () => {
  expect([0, 35, 50].map((value) => waterSalinity('test', value))).toEqual([0, 35, 50]);
  for (const value of [-1, 50.1, NaN]) expect(errorOf(() => waterSalinity('test', value)).code).toBe('out-of-range');
  expect(errorOf(() => weiss1974(25, -1)).where).toBe('weiss1974, salinity');
});

it('henrySolubility refuses a constant that is none', () => {
  expect(errorOf(() => henrySolubility(25, { solubilityMolPerM3Pa: 0, vantHoffK: 2400 })).code).toBe('out-of-range');
  expect(errorOf(() => henrySolubility(25, { solubilityMolPerM3Pa: 1, vantHoffK: NaN })).code).toBe('out-of-range');
});
