import { describe, expect, it } from 'vitest';
import { checkUnit } from '../../../src-main/quantities/check-unit.ts';

describe('checkUnit', () => {
  it.each([
    ['temperature-anomaly', 'K', 'K', 1],
    ['temperature-anomaly', '°C', 'K', 1],
    ['temperature', 'deg C', 'K', 1],
    ['temperature', 'degC', 'K', 1],
    ['temperature', '0.01 °C', 'K', 0.01],
    ['temperature-anomaly', '°F', 'K', 5 / 9],
    ['temperature-anomaly', 'degrees F', 'K', 5 / 9],
    ['co2', 'ppm', 'ppm', 1],
    ['co2', 'µmol/mol', 'ppm', 1],
    ['co2', 'μmol mol⁻¹', 'ppm', 1],
    ['co2', 'umol mol-1', 'ppm', 1],
    ['co2', 'ppb', 'ppm', 0.001],
    ['forcing', 'W/m²', 'W/m²', 1],
    ['forcing', 'W m-2', 'W/m²', 1],
    ['forcing', 'W m⁻²', 'W/m²', 1],
    ['forcing', 'W m^-2', 'W/m²', 1],
    ['forcing', 'W/m^2', 'W/m²', 1],
    ['forcing', 'mW/m2', 'W/m²', 0.001],
    ['forcing', 'W m-2', 'W/m² of imbalance', 1],
    ['other', 'mW m⁻²', 'W/m² of imbalance', 0.001],
  ] as const)('takes a %s series in %s for %s', (quantity, unit, wanted, factor) => {
    expect(checkUnit({ name: 's', quantity, unit }, wanted)).toBeCloseTo(factor, 15);
  });

  it('refuses another quantity, naming the series and what is needed', () => {
    expect(() => checkUnit({ name: 'mlo', quantity: 'co2', unit: 'ppm' }, 'K')).toThrow(
      /series mlo: expected a temperature series in K, °C or °F, but found a series of quantity “co2”/,
    );
  });

  it('takes a series of another kind for an imbalance, but not for a forcing, and not in another unit', () => {
    const other = { name: 'net-flux', quantity: 'other', unit: 'W/m²' } as const;
    expect(() => checkUnit(other, 'W/m²')).toThrow(/a forcing series in W\/m²/);
    expect(() => checkUnit({ ...other, unit: 'ZJ' }, 'W/m² of imbalance')).toThrow(/the unit “ZJ”/);
    expect(() => checkUnit({ ...other, quantity: 'co2' }, 'W/m² of imbalance')).toThrow(/energy imbalance/);
  });

  it('refuses an unknown unit and a missing one', () => {
    expect(() => checkUnit({ name: 't', quantity: 'temperature', unit: 'furlong' }, 'K')).toThrow(/the unit “furlong”/);
    expect(() => checkUnit({ name: 't', quantity: 'temperature', unit: '' }, 'K')).toThrow(/without a unit/);
    expect(() => checkUnit({ name: 't', quantity: 'temperature', unit: 'constructor' }, 'K')).toThrow(/constructor/);
  });
});
