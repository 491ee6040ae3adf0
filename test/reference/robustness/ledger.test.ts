import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { testAssumptions } from '../../../src-main/assumptions/test-assumptions.ts';
import { recompute } from '../../../src-main/climate/procedures/recompute.ts';
import type { AssumptionId, AssumptionOutcome } from '../../../src-main/contract/result.ts';
import { claimSweep } from '../../../src-main/robustness/claim-sweep.ts';
import { windowSweep } from '../../../src-main/robustness/window-sweep.ts';
import { computationOf, logRegressionProcedure, realCo2, realTemperature } from '../../helpers/claim-computation.ts';
import { expectClose } from '../../helpers/close.ts';
import { ar6EnergyBudget } from '../../helpers/log-regression-claim.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: the real record (vega-datasets) through testAssumptions and the sweeps, against lm of base R on the same
// annual rows, joined here by other code than that under test.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./ledger.R', import.meta.url));
});
afterAll(() => r.close());

const near = { rel: 1e-9, abs: 1e-12, why: 'two double-precision programs on well-posed problems' };
const { years, co2Ppm, temperatureK } = co2AndTemperature();
const x = co2Ppm.map((value) => Math.log(value / (co2Ppm[0] ?? NaN)));
const y = temperatureK.map((value) => value - (temperatureK[0] ?? NaN));

const series = { co2SeriesId: realCo2(), temperatureSeriesId: realTemperature() };
const plain = computationOf(logRegressionProcedure, series, {
  presentedAs: 'equilibrium-climate-sensitivity',
  statedRSquared: '0.92',
});
const claim = {
  ...plain,
  seed: 20_261,
  evidence: {
    ...plain.evidence,
    energyBudget: ar6EnergyBudget,
    comparedWith: 'ar6-ecs',
    quotedRange: { low: '2', high: '5', levelPercent: 90 },
  },
};

describe('windowSweep against R, every window of the real record', () => {
  it.each([
    { minYears: 52, anchorYears: 1, intercept: false, lag: -1 },
    { minYears: 52, anchorYears: 5, intercept: false, lag: 3 },
    { minYears: 53, anchorYears: 1, intercept: true, lag: -1 },
    { minYears: 53, anchorYears: 1, intercept: true, lag: 6 },
  ])('%j', async ({ minYears, anchorYears, intercept, lag }) => {
    const { windows, quantiles } = windowSweep({
      years,
      co2Ppm,
      y: temperatureK,
      minYears,
      intercept,
      anchor: { kind: 'mean-of-first', years: anchorYears },
      covariance: lag < 0 ? { kind: 'classical' } : { kind: 'newey-west', lag, smallSample: false },
    });
    const reference = await r.numbers(
      `all_windows(years, co2, temperature, ${minYears}, ${anchorYears}, ${intercept ? 'TRUE' : 'FALSE'}, ${lag})`,
      { years, co2: co2Ppm, temperature: temperatureK },
    );
    const { min, q05, q50, q95, max } = quantiles;
    expectClose(
      {
        start: windows.map(({ start }) => start),
        end: windows.map(({ end }) => end),
        slope: windows.map(({ slope }) => slope),
        error: windows.map(({ standardError }) => standardError),
        quantiles: [min, q05, q50, q95, max],
      },
      reference,
      near,
    );
  });
});

describe('the ledger of the real record against R', () => {
  const answer = testAssumptions(claim);
  const outcomeOf = (id: AssumptionId): AssumptionOutcome => {
    const found = answer.outcomes.find((outcome) => outcome.id === id);
    if (!found) throw new Error(`${id} is not in the ledger`);
    return found;
  };

  it('zero-intercept: number, interval, t and p (Newey–West, lag 3), partial F', async () => {
    const { alternative, statistic } = outcomeOf('zero-intercept');
    const { partial_f: partialF, ...reference } = await r.numbers('zero_intercept(x, y, 3)', { x, y });
    expectClose(
      {
        number: [alternative?.value],
        low: [alternative?.interval?.low],
        high: [alternative?.interval?.high],
        t: [statistic?.value],
        p: [statistic?.p],
      },
      reference,
      near,
    );
    expect(statistic?.convention).toContain(`lag 3`);
    expect(statistic?.convention).toContain(
      `partial F (classical) = ${(partialF?.[0] ?? NaN).toFixed(2)} with 1 and 58`,
    );
  });

  it('anchor-year: the number from each of the years', async () => {
    const listed = outcomeOf('anchor-year').table?.rows.filter(([label]) => /^\d{4}$/.test(String(label))) ?? [];
    const reference = await r.numbers('list(numbers = each_anchor(co2, temperature))', {
      co2: co2Ppm,
      temperature: temperatureK,
    });
    expectClose({ numbers: listed.map((row) => row[1]) }, reference, near);
  });

  it('r-squared: both R², r, and R² of CO2 and of time alone', async () => {
    const [centred, uncentred, correlation, co2, time] =
      outcomeOf('r-squared').table?.rows.map((row) => [row[1]]) ?? [];
    const reference = await r.numbers('determination(x, y, years)', { x, y, years });
    expectClose({ centred, uncentred, r: correlation, co2, time }, reference, near);
  });

  it('runs whole and hangs together', () => {
    const { ladder, outcomes } = answer;
    expect(outcomes).toHaveLength(9);
    expect(outcomes.filter(({ isTestable }) => !isTestable).map(({ id }) => id)).toEqual(['omitted-forcings']);
    const recomputed = recompute(claim).value;
    for (const { alternative, effect } of outcomes.filter(({ alternative }) => alternative)) {
      expectClose(effect, (alternative?.value ?? NaN) - recomputed, { rel: 1e-9, abs: 1e-12, why: 'a difference' });
    }
    expectClose(ladder?.start.value, recomputed, near);
    expectClose(ladder?.rungs[0]?.value, outcomeOf('zero-intercept').alternative?.value, near);
    expectClose((ladder?.rungs[1]?.value ?? NaN) / (ladder?.rungs[0]?.value ?? NaN), 2.2 / 1.61, near);
    const { alternative, statistic } = outcomeOf('window');
    const sweep = claimSweep({ ...claim, minYears: 20 });
    expect(alternative?.value).toBe(sweep.valueQuantiles.q50);
    expect(statistic?.value).toBe(sweep.stated.percentile);
  });
});
