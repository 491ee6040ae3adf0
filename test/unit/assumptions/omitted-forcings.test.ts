import { describe, expect, it } from 'vitest';
import { omittedForcings } from '../../../src-main/assumptions/omitted-forcings.ts';
import { testContext } from '../../../src-main/assumptions/test-context.ts';
import type { AssumptionOutcome } from '../../../src-main/contract/result.ts';
import { annualSeries } from '../../helpers/claim-computation.ts';
import { expectClose } from '../../helpers/close.ts';
import { ar1Noise, inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

const exact = { rel: 1e-10, abs: 1e-12, why: 'a record built to be exact' };
const { years, co2Ppm, x } = inventedCo2(60);
const doublingWm2 = { best: 3.7, low: 3.3, high: 4.1, levelPercent: 90, source: 'invented' };
const co2ForcingWm2 = x.map((value) => (doublingWm2.best * value) / Math.LN2);

const figure = ({ table }: AssumptionOutcome, label: RegExp) =>
  Number(table?.rows.find(([name]) => label.test(String(name)))?.[1] ?? NaN);

describe('omitted-forcings', () => {
  it.each([
    { ratio: 1.3, intercept: false },
    { ratio: 0.8, intercept: true },
  ])(
    'a record in proportion to $ratio times the forcing of CO2 gives S = F2x b_F = number ÷ ratio',
    ({ ratio, intercept }) => {
      const kPerWm2 = 0.5;
      const totalForcingWm2 = co2ForcingWm2.map((value) => ratio * value + 0.7);
      const temperatureK = totalForcingWm2.map((value) => kPerWm2 * value - 0.2);
      const claim = logRegressionClaim({
        years,
        co2Ppm,
        temperatureK,
        totalForcingWm2,
        evidence: { doublingWm2 },
        procedure: { intercept },
      });
      const context = testContext(claim);
      const { alternative, effect, statistic } = omittedForcings.test(context);
      expectClose(context.recomputation.value, ratio * kPerWm2 * doublingWm2.best, exact);
      expectClose(alternative?.value, kPerWm2 * doublingWm2.best, exact);
      expectClose(effect, (1 - ratio) * kPerWm2 * doublingWm2.best, exact);
      expectClose(statistic?.value, ratio, exact);
      // The slope is exact, so the interval is that of the forcing of a doubling alone: 0.5 (3.7 ± 0.4) at 5–95 %.
      const monteCarlo = {
        rel: 0,
        abs: 4 * 0.015 * 0.5 * (0.4 / 1.6448536269514722),
        why: 'a 5 % quantile of 20 000 draws is known to 0.015 σ',
      };
      expectClose(alternative?.interval, { low: 1.65, high: 2.05, levelPercent: 90 }, monteCarlo);
    },
  );

  it('takes the forcing of a doubling from the energy budget when it is given nowhere else', () => {
    const temperatureK = co2ForcingWm2.map((value) => 0.5 * value);
    const zero = { best: 0, low: 0, high: 0, levelPercent: 90, source: '' };
    const claim = logRegressionClaim({
      years,
      co2Ppm,
      temperatureK,
      totalForcingWm2: co2ForcingWm2,
      evidence: {
        energyBudget: {
          warmingK: zero,
          forcingWm2: zero,
          uptakeWm2: zero,
          doublingWm2: { best: 4, low: 4, high: 4, levelPercent: 90, source: '' },
        },
      },
    });
    expectClose(omittedForcings.test(testContext(claim)).alternative?.value, 2, exact);
  });

  it('gives the number in the unit of the claim', () => {
    const temperatureK = co2ForcingWm2.map((value) => 0.5 * value);
    const inUnit = (procedure: object, statement: object) =>
      omittedForcings.test(
        testContext(
          logRegressionClaim({
            years,
            co2Ppm,
            temperatureK,
            totalForcingWm2: co2ForcingWm2,
            evidence: { doublingWm2 },
            procedure,
            statement,
          }),
        ),
      );
    const perEFolding = inUnit({ conversion: 'per-e-folding' }, { unit: 'K per e-folding', value: '2.7' });
    expectClose(perEFolding.alternative?.value, 1.85 / Math.LN2, exact);
    expectClose(perEFolding.effect, 0, exact);
    const fahrenheit = inUnit({}, { unit: '°F per doubling', value: '3.3' });
    expectClose(fahrenheit.alternative?.value, 1.85 * 1.8, exact);
  });

  it('tells two predictors apart where they differ, with their variance inflation', () => {
    const otherWm2 = years.map((_, row) => 0.5 * Math.sin(row / 4));
    const totalForcingWm2 = co2ForcingWm2.map((value, row) => value + (otherWm2[row] ?? 0));
    const temperatureK = co2ForcingWm2.map((value, row) => 0.6 * value + 0.2 * (otherWm2[row] ?? 0));
    const claim = { years, co2Ppm, temperatureK, totalForcingWm2, co2ForcingWm2, evidence: { doublingWm2 } };
    const outcome = omittedForcings.test(testContext(logRegressionClaim({ ...claim, procedure: { intercept: true } })));
    expectClose(figure(outcome, /two predictors: slope on CO₂/), 0.6, exact);
    expectClose(figure(outcome, /two predictors: slope on all others/), 0.2, exact);
    expectClose(figure(outcome, /two predictors: forcing of a doubling/), 0.6 * doublingWm2.best, exact);
    // With two predictors the factor is 1/(1 − r²) of the one on the other.
    const mean = (values: readonly number[]) => values.reduce((total, value) => total + value, 0) / values.length;
    const [a, b] = [co2ForcingWm2, otherWm2].map((values) => values.map((value) => value - mean(values)));
    const dot = (p: readonly number[] = [], q: readonly number[] = []) =>
      p.reduce((total, value, row) => total + value * (q[row] ?? 0), 0);
    const inflation = 1 / (1 - dot(a, b) ** 2 / (dot(a, a) * dot(b, b)));
    expectClose(figure(outcome, /variance inflation of CO₂/), inflation, exact);
    expectClose(figure(outcome, /variance inflation of all others/), inflation, exact);
  });

  it('says when two predictors move exactly in step', () => {
    const totalForcingWm2 = co2ForcingWm2.map((value) => 1.25 * value);
    const temperatureK = totalForcingWm2.map((value, row) => 0.5 * value + 0.05 * Math.sin(row));
    const outcome = omittedForcings.test(
      testContext(
        logRegressionClaim({ years, co2Ppm, temperatureK, totalForcingWm2, co2ForcingWm2, evidence: { doublingWm2 } }),
      ),
    );
    expect(outcome.caveats.map(({ code }) => code)).toContain('inseparable');
    expect(outcome.isTestable).toBe(true);
  });

  it('does without the years that have no forcing, names them, and gives the number on the same years', () => {
    const noise = ar1Noise(60, { sd: 0.1, carryOver: 0.3, seed: 31 });
    const temperatureK = co2ForcingWm2.map((value, row) => 0.6 * value + (noise[row] ?? 0));
    const totalForcingWm2 = co2ForcingWm2.map((value, row) => (row < 50 ? 1.2 * value : null));
    const outcome = omittedForcings.test(
      testContext(logRegressionClaim({ years, co2Ppm, temperatureK, totalForcingWm2, evidence: { doublingWm2 } })),
    );
    expect(outcome.caveats[0]?.detail).toMatch(/No total forcing in 2000–2009/);
    expectClose(figure(outcome, /same years/), (outcome.alternative?.value ?? NaN) * 1.2, exact);
  });

  it.each([
    [
      'no forcing series',
      {},
      { reason: 'No series of total forcing is given.', wouldNeed: /Import annual effective radiative forcing/ },
    ],
    [
      'no forcing of a doubling',
      { totalForcingWm2: co2ForcingWm2 },
      { reason: /The forcing of a CO₂ doubling is not given/, wouldNeed: /W\/m², with its range/ },
    ],
  ])('says what is missing: %s', (_, given, { reason, wouldNeed }) => {
    const claim = logRegressionClaim({ years, co2Ppm, temperatureK: x.map((value) => 2.7 * value), ...given });
    const outcome = omittedForcings.test(testContext(claim));
    expect(outcome.isTestable).toBe(false);
    expect(outcome.missing?.reason).toMatch(reason);
    expect(outcome.missing?.wouldNeed).toMatch(wouldNeed);
    expect(omittedForcings.rung?.(testContext(claim))).toHaveProperty('reason');
  });

  it('refuses a forcing series that is none', () => {
    const claim = logRegressionClaim({ years, co2Ppm, temperatureK: x, totalForcingWm2: x, evidence: { doublingWm2 } });
    const series = { ...claim.series, totalForcingSeriesId: annualSeries('odd', 'forcing', 'furlongs', years, x) };
    expect(() => omittedForcings.test(testContext({ ...claim, series }))).toThrow(/furlongs/);
  });
});
