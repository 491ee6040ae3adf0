import { describe, expect, it } from 'vitest';
import { co2LogDoublingWm2, co2LogForcing } from '../../../src-main/climate/co2-log-forcing.ts';

describe('co2LogForcing', () => {
  // Facts of the trade: 5.35 ln 2 = 3.71 W/m² per doubling, twice that for two doublings, nothing for no change.
  it.each([
    [560, 280, 3.708337],
    [1120, 280, 7.416675],
    [140, 280, -3.708337],
    [280, 280, 0],
  ])('of %d against %d ppm is %d W/m²', (co2Ppm, referencePpm, forcingWm2) => {
    expect(co2LogForcing(co2Ppm, referencePpm)).toBeCloseTo(forcingWm2, 6);
  });

  it('is exactly zero at the reference, and 5.35 ln 2 for a doubling', () => {
    expect(co2LogForcing(277.15, 277.15)).toBe(0);
    expect(co2LogDoublingWm2).toBeCloseTo(3.708337, 6);
  });

  it.each([
    [0, 280],
    [560, -1],
    [NaN, 280],
    [560, Infinity],
  ])('refuses %d against %d', (co2Ppm, referencePpm) => {
    expect(() => co2LogForcing(co2Ppm, referencePpm)).toThrow(/two CO2 concentrations above 0 ppm/);
  });
});
