import { describe, expect, it } from 'vitest';
import { exchangeCaveats } from '../../../../src-main/climate/carbon/exchange-caveats.ts';
import type { ExchangeInput } from '../../../../src-main/contract/carbon.ts';

const weiss: ExchangeInput = { source: 'weiss1974', temperatureC: 15, salinity: 35 };
const takahashi: ExchangeInput = { source: 'takahashi1993', temperatureC: 15 };
const codes = (input: ExchangeInput, warmingK: number | null = null) =>
  exchangeCaveats(input, warmingK).map(({ code }) => code);
const detail = (input: ExchangeInput, code: string, warmingK: number | null = null) =>
  exchangeCaveats(input, warmingK).find((caveat) => caveat.code === code)?.detail;

it('says of every source what its coefficient describes, and nothing else where nothing is amiss', () => {
  expect(codes(weiss)).toEqual(['scope-solubility']);
  expect(codes(takahashi)).toEqual(['scope-isochemical']);
});

describe('outside-fitted-range', () => {
  it.each([
    ['weiss1974', -1, 40],
    ['takahashi1993', 2.1, 24.5],
    ['takahashi1993-quadratic', 2.1, 24.5],
    ['humphreys2024-fit', 2.1, 24.5],
    ['humphreys2024-enthalpy', -2, 35],
    ['henry-vant-hoff', 5, 45],
  ] as const)('of %s: on beyond %s and %s °C, off at them', (source, lowC, highC) => {
    const at = (temperatureC: number) =>
      codes({ source, temperatureC, ...(source === 'weiss1974' ? { salinity: 35 } : {}) });
    for (const value of [lowC, highC]) expect(at(value)).not.toContain('outside-fitted-range');
    for (const value of [lowC - 0.1, highC + 0.1]) expect(at(value)).toContain('outside-fitted-range');
  });

  it('where only the end of the change leaves the range', () => {
    expect(codes(takahashi, 9)).not.toContain('outside-fitted-range');
    expect(detail(takahashi, 'outside-fitted-range', 9.91)).toContain('A change by 9.9 K ends at 24.9 °C');
    expect(detail(takahashi, 'outside-fitted-range', -14)).toContain('ends at 1.0 °C');
  });

  it('thinks of °F above the range', () => {
    expect(detail({ ...weiss, temperatureC: 59 }, 'outside-fitted-range')).toContain('If it was °F, it is 15.0 °C.');
    expect(detail({ ...weiss, temperatureC: -2 }, 'outside-fitted-range')).not.toContain('°F');
  });
});

it('salinity: where it does nothing, is too high, or looks like a share', () => {
  expect(codes({ ...takahashi, salinity: 35 })).toContain('salinity-not-used');
  expect(codes({ ...weiss, salinity: 40 })).not.toContain('outside-salinity-range');
  expect(codes({ ...weiss, salinity: 40.1 })).toContain('outside-salinity-range');
  expect(detail({ ...weiss, salinity: 0.035 }, 'salinity-as-fraction')).toContain('it is 35 g/kg');
  for (const salinity of [0, 0.019, 0.046]) expect(codes({ ...weiss, salinity })).toEqual(['scope-solubility']);
});

it('slope-changes: on where the coefficient moves by 2 % over the change', () => {
  expect(detail(weiss, 'slope-changes', 10)).toContain('33.0 K. At the end of a change by 10.0 K it is 39.6 K');
  expect(codes(weiss, 0.5)).not.toContain('slope-changes');
  expect(codes(takahashi, 9)).not.toContain('slope-changes');
  expect(codes({ ...takahashi, source: 'takahashi1993-quadratic' }, -12)).toContain('slope-changes');
  expect(codes(weiss, 80)).not.toContain('slope-changes');
});

it('ppm-for-microatm: with a level', () => {
  expect(codes({ ...takahashi, co2Ppm: 280 })).toContain('ppm-for-microatm');
});
