import { describe, expect, it } from 'vitest';
import { warmingFromZero } from '../../../../src-main/climate/procedures/warming-from-zero.ts';
import { annualSeries } from '../../../helpers/claim-computation.ts';

const series = (quantity: 'temperature-anomaly' | 'temperature' | 'co2', unit: string) =>
  annualSeries('lagoon', quantity, unit, [1], [1]);

describe('warmingFromZero', () => {
  it('turns a warming in °F into K', () => {
    expect(warmingFromZero(series('temperature-anomaly', '°F'))).toBeCloseTo(1 / 1.8, 15);
    expect(warmingFromZero(series('temperature-anomaly', '°C'))).toBe(1);
  });

  it('refuses temperatures, and what is no temperature', () => {
    expect(() => warmingFromZero(series('temperature', 'K'))).toThrow(
      /series lagoon: expected a warming.*found temperatures.*control run/s,
    );
    expect(() => warmingFromZero(series('co2', 'ppm'))).toThrow(/a temperature series/);
  });
});
