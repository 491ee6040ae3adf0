import { describe, expect, it } from 'vitest';
import { compareEstimators } from '../../../../src-main/climate/estimators/compare-estimators.ts';
import { freeInterceptCaveats, tInterval, tWords } from '../../../../src-main/climate/estimators/estimator.ts';
import { residualTestLines } from '../../../../src-main/climate/estimators/residual-test-lines.ts';
import { fittedLine } from '../../../../src-main/climate/procedures/fitted-line.ts';
import { recompute } from '../../../../src-main/climate/procedures/recompute.ts';
import type { ClaimComputation } from '../../../../src-main/contract/compute.ts';
import { estimatorComparison, type EstimatorId } from '../../../../src-main/contract/estimator-comparison.ts';
import { movingBlockBootstrap } from '../../../../src-main/statistics/moving-block-bootstrap.ts';
import { regression } from '../../../../src-main/statistics/regression.ts';
import { residualTests } from '../../../../src-main/statistics/residual-tests.ts';
import { computationOf } from '../../../helpers/claim-computation.ts';
import { ar1Noise, inventedCo2, logRegressionClaim } from '../../../helpers/log-regression-claim.ts';

// Invented: 2.4 K per e-folding, an offset, errors that carry over.
const { years, co2Ppm, x } = inventedCo2(60);
const noise = ar1Noise(60, { sd: 0.1, carryOver: 0.5, seed: 3 });
const temperatureK = x.map((value, row) => 0.15 + 2.4 * value + (noise[row] ?? NaN));
const record = { years, co2Ppm, temperatureK };

const of = (computation: ClaimComputation, id: EstimatorId) => {
  const found = compareEstimators(computation).estimates.find((estimate) => estimate.id === id);
  if (!found) throw new Error(`no estimate ${id}`);
  return found;
};
const withLimits = (computation: ClaimComputation, halfWidth: number, ofCo2 = false): ClaimComputation => {
  const bounded = (role: 'temperatureSeriesId' | 'co2SeriesId', width: number) => {
    const series = computation.series[role];
    if (!series) throw new Error('no series');
    const shifted = (by: number) => series.values.values.map((value) => (value === null ? null : value + by));
    return {
      [role]: {
        ...series,
        values: { ...series.values, lower: shifted(-width), upper: shifted(width), boundsLevelPercent: 95 },
      },
    };
  };
  return {
    ...computation,
    series: {
      ...computation.series,
      ...bounded('temperatureSeriesId', halfWidth),
      ...(ofCo2 ? bounded('co2SeriesId', 4) : {}),
    },
  };
};

describe('compareEstimators', () => {
  it('answers by the contract, every number with its convention', () => {
    for (const intercept of [true, false]) {
      const comparison = compareEstimators(
        withLimits(logRegressionClaim({ ...record, procedure: { intercept } }), 0.1),
      );
      expect(estimatorComparison.strict().parse(comparison)).toEqual(comparison);
      expect(comparison.notComputed).toEqual([]);
      for (const { convention } of comparison.estimates) expect(convention).not.toBe('');
      expect(new Set(comparison.estimates.map(({ id }) => id)).size).toBe(comparison.estimates.length);
    }
  });

  it('has the recomputed number and its error on the line that the procedure asks for', () => {
    for (const covariance of [{ kind: 'classical' }, { kind: 'newey-west', lag: 5, smallSample: true }] as const) {
      const computation = logRegressionClaim({ ...record, procedure: { covariance } });
      const { value, standardError, interval } = recompute(computation);
      const own = compareEstimators(computation).estimates.filter(({ isOwn }) => isOwn);
      expect(own).toMatchObject([{ value, standardError, interval95: interval }]);
    }
  });

  it('says where the Newey–West lag comes from', () => {
    const convention = (
      covariance: { kind: 'classical' } | { kind: 'newey-west'; lag: number; smallSample: boolean },
    ) => of(logRegressionClaim({ ...record, procedure: { covariance } }), 'ols-newey-west').convention;
    expect(convention({ kind: 'classical' })).toMatch(/lag 3,.*rule of thumb/);
    expect(convention({ kind: 'newey-west', lag: 5, smallSample: true })).toMatch(/lag 5,.*with the factor.*own/);
  });

  it('says which lag was chosen from the data, the same that the regression chooses', () => {
    const computation = logRegressionClaim(record);
    const { fit } = recompute(computation);
    const { chosenLag, standardErrors } = regression({
      x: fit?.x ?? [],
      y: fit?.y ?? [],
      intercept: false,
      covariance: { kind: 'newey-west', lag: 'newey-west-1994' },
    });
    const { convention, standardError, order } = of(computation, 'ols-newey-west-1994');
    expect(convention).toMatch(
      new RegExp(
        `lag ${chosenLag}, no prewhitening.*; the lag is that of Newey & West 1994 for the products of x and residual; t`,
      ),
    );
    expect(standardError).toBeCloseTo((standardErrors[0] ?? NaN) * Math.LN2, 14);
    expect(order).toBe('calendar');
    const withIntercept = of(logRegressionClaim({ ...record, procedure: { intercept: true } }), 'ols-newey-west-1994');
    expect(withIntercept.convention).toContain('the constant’s left out');
  });

  it('turns every number into the claim’s unit by the same factor', () => {
    const numbers = (unit: 'K per doubling' | 'K per e-folding', conversion: 'per-doubling' | 'per-e-folding') =>
      compareEstimators(
        withLimits(logRegressionClaim({ ...record, statement: { unit }, procedure: { conversion } }), 0.1),
      ).estimates.flatMap(({ value, standardError, interval95 }) => [
        value,
        standardError ?? 0,
        interval95?.low ?? NaN,
        interval95?.high ?? NaN,
      ]);
    const doubling = numbers('K per doubling', 'per-doubling');
    numbers('K per e-folding', 'per-e-folding').forEach((value, at) =>
      expect(doubling[at]).toBeCloseTo(value * Math.LN2, 12),
    );
  });

  it('holds free-intercept estimators against a line with a free intercept', () => {
    const through = withLimits(logRegressionClaim(record), 0.1);
    const free = withLimits(logRegressionClaim({ ...record, procedure: { intercept: true } }), 0.1);
    expect(of(through, 'ols-free-intercept').value).toBe(of(free, 'ols-classical').value);
    expect(() => of(free, 'ols-free-intercept')).toThrow('no estimate');
    for (const id of ['theil-sen', 'york', 'york-scaled'] as const) {
      expect(of(through, id).caveats.map(({ code }) => code)).toContain('free-intercept');
      expect(of(free, id).caveats.map(({ code }) => code)).not.toContain('free-intercept');
      expect(of(through, id).value).toBe(of(free, id).value);
    }
  });

  it('says why an estimator has no answer, and keeps the others', () => {
    const { notComputed, estimates } = compareEstimators(logRegressionClaim(record));
    expect(notComputed.map(({ ids }) => ids)).toEqual([['york', 'york-scaled']]);
    expect(notComputed[0]?.reason).toContain('series air: expected annual values with limits');
    expect(estimates).toHaveLength(13);
  });

  it('has neither likelihoods nor tests for an exact line, and says so', () => {
    const exact = logRegressionClaim({ ...record, temperatureK: x.map((value) => 2 * value) });
    const { notComputed, residualTests: tests, testsMissing } = compareEstimators(exact);
    expect(notComputed.flatMap(({ ids }) => ids)).toContain('gls-ar1-ml');
    expect(tests).toEqual([]);
    expect(testsMissing).toContain('an exact fit');
  });

  it('York takes errors of CO2 into account where that series has limits too', () => {
    const computation = logRegressionClaim({ ...record, procedure: { intercept: true } });
    const exactCo2 = of(withLimits(computation, 0.1), 'york');
    const both = of(withLimits(computation, 0.1, true), 'york');
    expect(exactCo2.convention).toContain('CO2 taken as exact');
    expect(both.convention).toContain('of x from those of carbon');
    // An error in x has flattened the least-squares line: York's is steeper.
    expect(both.value).toBeGreaterThan(exactCo2.value);
  });

  it('York says when the scatter is beyond the limits, which the scaled error counts', () => {
    const narrow = withLimits(logRegressionClaim(record), 0.02);
    expect(of(narrow, 'york').caveats.map(({ code }) => code)).toContain('scatter-beyond-limits');
    const [plain, scaled] = [of(narrow, 'york'), of(narrow, 'york-scaled')];
    const [goodness] = plain.parameters;
    expect(scaled.standardError).toBeCloseTo((plain.standardError ?? NaN) * Math.sqrt(goodness?.value ?? NaN), 12);
    expect(of(withLimits(logRegressionClaim(record), 0.4), 'york').caveats.map(({ code }) => code)).not.toContain(
      'scatter-beyond-limits',
    );
  });

  it('says of a gap that the order of rows is not the calendar', () => {
    const gapped = logRegressionClaim({
      years: years.filter((_, row) => row !== 20 && row !== 21),
      co2Ppm: co2Ppm.filter((_, row) => row !== 20 && row !== 21),
      temperatureK: temperatureK.filter((_, row) => row !== 20 && row !== 21),
    });
    const { gaps, estimates, residualTests: tests } = compareEstimators(gapped);
    expect(gaps.years).toEqual([1970, 1971]);
    expect(gaps.sentence).toMatch(/No value in 1970–1971\. Taking .* without the calendar distance: .*Newey–West/);
    expect(gaps.sentence).toMatch(
      /The calendar distance is used by Least squares, Newey–West, lag from the data; AR\(1\), .*likelihood; ARMA\(1,1\)/,
    );
    const warned = estimates.filter(({ caveats }) => caveats.some(({ code }) => code === 'gap-in-window'));
    expect(warned.map(({ id }) => id)).toEqual([
      'ols-newey-west',
      'block-bootstrap',
      'prais-winsten',
      'cochrane-orcutt',
    ]);
    expect(tests.every(({ caveats }) => caveats.some(({ code }) => code === 'gap-in-window'))).toBe(true);
    expect(compareEstimators(logRegressionClaim(record)).gaps).toMatchObject({ years: [] });
  });

  it('the block bootstrap draws from the claim’s seed, and says what it drew', () => {
    const computation = logRegressionClaim({ ...record, seed: 11 });
    const { fit } = recompute(computation);
    const { random, value, standardError, interval95, convention } = of(computation, 'block-bootstrap');
    expect(random).toMatchObject({ seed: 11, nDraws: 2000 });
    const [, length] = /blocks of (\d+) years/.exec(convention) ?? [];
    const { slope, quantiles, ...drawn } = movingBlockBootstrap({
      x: fit?.x ?? [],
      y: fit?.y ?? [],
      intercept: false,
      blockLength: Number(length),
      draws: 2000,
      seed: 11,
      resample: 'residuals',
    });
    expect(value).toBe(slope * Math.LN2);
    expect(standardError).toBe(drawn.standardError * Math.LN2);
    expect(interval95).toMatchObject({ low: quantiles.q025 * Math.LN2, high: quantiles.q975 * Math.LN2 });
    expect(of(logRegressionClaim({ ...record, seed: 12 }), 'block-bootstrap').standardError).not.toBe(standardError);
  });

  it('works on a trend, whose years are exact', () => {
    const series = withLimits(logRegressionClaim(record), 0.1).series.temperatureSeriesId;
    const trend = computationOf(
      { kind: 'trend', seriesId: 1, minMonths: 12, window: null, covariance: { kind: 'classical' }, per: 'decade' },
      series ? { seriesId: series } : {},
      { quantity: 'trend', unit: 'K per decade', value: '0.1' },
    );
    expect(of(trend, 'ols-classical').value).toBe(recompute(trend).value);
    expect(of(trend, 'york').convention).toContain('years exact');
  });

  it('tells how far it is, up to the end', () => {
    const told: number[] = [];
    compareEstimators(logRegressionClaim(record), (share) => told.push(share));
    expect(told).toEqual([...told].sort((a, b) => a - b));
    expect(told.at(-1)).toBe(1);
  });

  it('refuses a ratio', () => {
    const ratio = computationOf(
      { kind: 'ratio', numerator: { value: '3.7', unit: 'W/m²' }, denominator: { value: '2', unit: 'W/m²' } },
      {},
      { quantity: 'ratio', unit: '1', value: '1.9' },
    );
    expect(() => compareEstimators(ratio)).toThrow('a procedure that fits a line');
  });
});

describe('residualTestLines', () => {
  it('has the figures of residualTests, at the lag of the serial errors', () => {
    const computation = logRegressionClaim(record);
    const line = fittedLine({ computation, recomputation: recompute(computation) });
    const { durbinWatson, durbinWatsonTest, breuschGodfrey, ljungBox, ...others } = residualTests({
      x: line.fit.x,
      y: line.fit.y,
      intercept: false,
      lags: 3,
    });
    expect(residualTestLines(line)).toMatchObject([
      { id: 'durbin-watson', statistic: durbinWatson, p: durbinWatsonTest?.p, caveats: [{ code: 'no-intercept' }] },
      { id: 'breusch-godfrey', ...breuschGodfrey },
      { id: 'ljung-box', ...ljungBox },
      { id: 'breusch-pagan', p: others.breuschPagan.p },
      { id: 'jarque-bera', p: others.jarqueBera.p, caveats: [{ code: 'short-for-normality' }] },
    ]);
  });
});

describe('what the estimators share', () => {
  it('tInterval is slope ± t se: t(0.975) with 10 degrees of freedom is 2.228139', () => {
    const interval = tInterval(3, 0.5, 10);
    expect(interval?.low).toBeCloseTo(3 - 0.5 * 2.228139, 6);
    expect(interval?.high).toBeCloseTo(3 + 0.5 * 2.228139, 6);
    expect(tWords(10)).toBe('t with 10 degrees of freedom');
  });

  it('freeInterceptCaveats speaks only of a line without intercept', () => {
    const lineOf = (intercept: boolean) => {
      const computation = logRegressionClaim({ ...record, procedure: { intercept } });
      return fittedLine({ computation, recomputation: recompute(computation) });
    };
    expect(freeInterceptCaveats(lineOf(true))).toEqual([]);
    expect(freeInterceptCaveats(lineOf(false))).toHaveLength(1);
  });
});
