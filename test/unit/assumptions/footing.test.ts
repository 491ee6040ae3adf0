import { describe, expect, it } from 'vitest';
import { numberOnFooting, type Footing } from '../../../src-main/assumptions/footing.ts';
import { testContext } from '../../../src-main/assumptions/test-context.ts';
import { expectClose } from '../../helpers/close.ts';
import { inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

const exact = { rel: 1e-9, abs: 0, why: 'closed form' };
const { years, co2Ppm, x } = inventedCo2(60);
/** Distance of the 95 % point of a normal, in standard deviations. */
const z95 = 1.6448536269514722;
const given = (best: number, halfWidth: number) => ({
  best,
  low: best - halfWidth,
  high: best + halfWidth,
  levelPercent: 90,
  source: 'invented',
});

/** Total forcing 1.25 times that of CO2, and 0.5 K per W/m² of it; the first year, the anchor, off by `firstYearK`. */
const total = x.map((value) => (1.25 * 3.7 * value) / Math.LN2);
const contextWith = (firstYearK: number) =>
  testContext(
    logRegressionClaim({
      years,
      co2Ppm,
      temperatureK: total.map((value, row) => 0.5 * value + (row === 0 ? firstYearK : 0)),
      totalForcingWm2: total,
      evidence: {
        doublingWm2: given(3.7, 0.4),
        energyBudget: {
          warmingK: given(1, 0.1),
          forcingWm2: given(2, 0.5),
          uptakeWm2: given(0.5, 0.3),
          doublingWm2: given(4, 0.5),
        },
      },
    }),
  );

const y = total.map((value, row) => (row === 0 ? 0 : 0.5 * value + 0.1));
const dot = (a: readonly number[], b: readonly number[]) =>
  a.reduce((sum, value, row) => sum + value * (b[row] ?? NaN), 0);
const centred = (values: readonly number[]) => {
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  return values.map((value) => value - mean);
};
const forced = (dot(x, y) / dot(x, x)) * Math.LN2;
const free = (dot(centred(x), centred(y)) / dot(centred(x), centred(x))) * Math.LN2;

const footings: [Partial<Footing>, number][] = [
  [{}, forced],
  [{ hasFreeIntercept: true }, free],
  [{ predictor: 'total-forcing' }, forced / 1.25],
  [{ countsHeatUptake: true }, (forced * 2) / 1.5],
  [{ hasFreeIntercept: true, predictor: 'total-forcing', countsHeatUptake: true }, ((free / 1.25) * 2) / 1.5],
];

describe('numberOnFooting', () => {
  it.each(footings)('%j', (changes, value) => {
    const context = contextWith(-0.1);
    const footing: Footing = { hasFreeIntercept: false, predictor: 'co2', countsHeatUptake: false, ...changes };
    const number = numberOnFooting(context, footing, context.draws);
    expectClose(number.value, value, exact);
    expect(number.draws).toHaveLength(context.draws.nDraws);
    expect(number.quantity).toBe(footing.countsHeatUptake ? 'effective-climate-sensitivity' : 'apparent-sensitivity');
  });

  it('shares draws between footings: where the slope is exact, the draws differ by the factor alone', () => {
    const context = contextWith(0);
    const footing: Footing = { hasFreeIntercept: false, predictor: 'total-forcing', countsHeatUptake: false };
    const without = numberOnFooting(context, footing, context.draws).draws;
    const doublings = context.draws.standardNormal('doubling');
    const some = [0, 1, 777, 19_999];
    for (const draw of some) expectClose(without[draw], 0.5 * (3.7 + (0.4 / z95) * (doublings[draw] ?? NaN)), exact);
    const withUptake = numberOnFooting(context, { ...footing, countsHeatUptake: true }, context.draws).draws;
    const forcings = context.draws.standardNormal('forcing');
    const uptakes = context.draws.standardNormal('uptake');
    for (const draw of some) {
      const forcing = 2 + (0.5 / z95) * (forcings[draw] ?? NaN);
      const uptake = 0.5 + (0.3 / z95) * (uptakes[draw] ?? NaN);
      expectClose(withUptake[draw], ((without[draw] ?? NaN) * forcing) / (forcing - uptake), exact);
    }
  });
});
