import { describe, expect, it } from 'vitest';
import { recompute } from '../../../src-main/climate/procedures/recompute.ts';
import type { Claim } from '../../../src-main/contract/claim.ts';
import { xyFigure } from '../../../src-main/contract/figure.ts';
import { residualFigures } from '../../../src-main/handlers/residual-figures.ts';
import { ar1Noise, inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

const { years, co2Ppm, x } = inventedCo2(50);
const noise = ar1Noise(50, { sd: 0.1, carryOver: 0.5, seed: 4 });
const temperatureK = x.map((value, row) => 0.2 + 2 * value + (noise[row] ?? NaN));
const claim = { id: 7 } as Claim;
const without = (...rows: number[]) => ({
  years: years.filter((_, row) => !rows.includes(row)),
  co2Ppm: co2Ppm.filter((_, row) => !rows.includes(row)),
  temperatureK: temperatureK.filter((_, row) => !rows.includes(row)),
});
const draw = (record: Parameters<typeof logRegressionClaim>[0]) =>
  residualFigures(claim, recompute(logRegressionClaim(record)), []);

describe('residualFigures', () => {
  it('are figures of the contract, each with a name of its own', () => {
    const { lag, autocorrelation, quantiles } = draw({ years, co2Ppm, temperatureK });
    const figures = [lag, autocorrelation, quantiles];
    for (const figure of figures) expect(xyFigure.parse(figure)).toEqual(figure);
    expect(new Set(figures.map((figure) => figure?.name)).size).toBe(3);
  });

  it('the lag plot pairs every year with the one before', () => {
    const recomputation = recompute(logRegressionClaim({ years, co2Ppm, temperatureK }));
    const residuals = recomputation.fit?.regression.residuals ?? [];
    const [points, line] = residualFigures(claim, recomputation, []).lag?.marks ?? [];
    expect(points).toMatchObject({ x: residuals.slice(0, -1), y: residuals.slice(1) });
    const r1 = recomputation.fit?.diagnostics.lag1Autocorrelation ?? NaN;
    expect((line?.y[1] ?? NaN) / (line?.x[1] ?? NaN)).toBeCloseTo(r1, 12);
  });

  it('the lag plot pairs nothing across a gap, and says so', () => {
    const gapped = draw(without(10, 11, 30));
    // 47 years, in three runs: 46 steps, two of them over a gap.
    expect(gapped.lag?.marks[0]?.x).toHaveLength(44);
    expect(gapped.lag?.caption).toContain('gap');
    expect(gapped.autocorrelation?.caption).toContain('calendar');
    expect(draw({ years, co2Ppm, temperatureK }).lag?.caption).not.toContain('gap');
  });

  it('the autocorrelation has its band named: ±1.96/√50 = ±0.28, to lag 10 log₁₀ 50', () => {
    const { autocorrelation } = draw({ years, co2Ppm, temperatureK });
    const [band, points] = autocorrelation?.marks ?? [];
    expect(autocorrelation?.caption).toContain('±1.96/√n = ±0.28');
    expect(band?.label).toBe('±1.96/√n');
    expect(band?.y2?.[0]).toBeCloseTo(1.96 / Math.sqrt(50), 14);
    expect(points?.x.at(-1)).toBe(16);
  });

  it('the quantile plot has all residuals in order', () => {
    const [points] = draw({ years, co2Ppm, temperatureK }).quantiles?.marks ?? [];
    expect(points?.y).toHaveLength(50);
    expect(points?.y).toEqual([...(points?.y ?? [])].sort((a, b) => Number(a) - Number(b)));
  });

  it('are absent for an exact line and before anything is computed', () => {
    const nothing = { lag: null, autocorrelation: null, quantiles: null };
    expect(draw({ years, co2Ppm, temperatureK: x.map((value) => 3 * value) })).toEqual(nothing);
    expect(residualFigures(claim, null, [])).toEqual(nothing);
  });
});
