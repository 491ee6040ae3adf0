import { describe, expect, it } from 'vitest';
import { testAssumptions } from '../../../src-main/assumptions/test-assumptions.ts';
import type { ClaimComputation } from '../../../src-main/contract/compute.ts';
import { assumptionsAnswer } from '../../../src-main/contract/result.ts';
import { annualSeries, computationOf } from '../../helpers/claim-computation.ts';
import { ar1Noise, ar6EnergyBudget, inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

const { years, co2Ppm, x } = inventedCo2(60);
const noise = ar1Noise(60, { sd: 0.1, carryOver: 0.4, seed: 41 });
const temperatureK = x.map((value, row) => 2.7 * value + (row === 0 ? 0.1 : 0) + (noise[row] ?? 0));
const totalForcingWm2 = x.map((value, row) => 6.5 * value + 0.1 * Math.sin(row));
const record = { years, co2Ppm, temperatureK };
const full = logRegressionClaim({
  ...record,
  totalForcingWm2,
  statement: { presentedAs: 'equilibrium-climate-sensitivity', statedRSquared: '0.9' },
  evidence: {
    energyBudget: ar6EnergyBudget,
    comparedWith: 'ar6-ecs',
    quotedRange: { low: '2', high: '5', levelPercent: 90 },
  },
});

const withoutRange = { ...full, evidence: { ...full.evidence, quotedRange: null } };

const all = [
  'anchor-year',
  'independent-errors',
  'like-for-like',
  'omitted-forcings',
  'quoted-range',
  'r-squared',
  'transient-as-equilibrium',
  'window',
  'zero-intercept',
];
const idsOf = (claim: ClaimComputation) =>
  testAssumptions(claim)
    .outcomes.map(({ id }) => id)
    .sort();

describe('testAssumptions', () => {
  it('tests all that apply to a line through zero, in the shape of the contract', () => {
    const answer = testAssumptions(full);
    expect(answer.outcomes.map(({ id }) => id).sort()).toEqual(all);
    expect(answer.outcomes.every(({ isTestable }) => isTestable)).toBe(true);
    expect(assumptionsAnswer.parse(JSON.parse(JSON.stringify(answer)))).toEqual(answer);
  });

  it('puts the weightiest first, and within one weight the largest effect', () => {
    const { outcomes } = testAssumptions(full);
    const rank = { decisive: 0, notable: 1, negligible: 2, none: 3 };
    const keys = outcomes.map(({ weight, effect }) => [rank[weight ?? 'none'], -Math.abs(effect ?? 0)] as const);
    expect(keys).toEqual([...keys].sort(([a, b], [c, d]) => a - c || b - d));
    expect(new Set(keys.map(([weight]) => weight)).size).toBeGreaterThan(1);
  });

  it('climbs the ladder: free intercept, all forcings, heat uptake; steps add up', () => {
    const { outcomes, ladder } = testAssumptions(full);
    expect(ladder?.rungs.map(({ assumptionId, quantity }) => [assumptionId, quantity])).toEqual([
      ['zero-intercept', 'apparent-sensitivity'],
      ['omitted-forcings', 'apparent-sensitivity'],
      ['transient-as-equilibrium', 'effective-climate-sensitivity'],
    ]);
    expect(ladder?.notApplied).toEqual([]);
    const steps = ladder?.rungs.reduce((total, { step }) => total + step, ladder.start.value);
    expect(steps).toBeCloseTo(ladder?.rungs.at(-1)?.value ?? NaN, 12);
    // The first rung stands on the claim's own footing, so it is the ledger's alternative.
    const alone = outcomes.find(({ id }) => id === 'zero-intercept')?.alternative?.value;
    expect(ladder?.rungs[0]?.value).toBeCloseTo(alone ?? NaN, 12);
    const [, second, third] = ladder?.rungs ?? [];
    expect((third?.value ?? NaN) / (second?.value ?? NaN)).toBeCloseTo(2.2 / 1.61, 12);
  });

  it('gives the same digits for the same seed, other draws but the same central values for another', () => {
    expect(testAssumptions(full)).toEqual(testAssumptions(full));
    const other = testAssumptions({ ...full, seed: full.seed + 1 });
    const { ladder } = testAssumptions(full);
    expect(other.ladder?.rungs.map(({ value }) => value)).toEqual(ladder?.rungs.map(({ value }) => value));
    expect(other.ladder?.start.interval90).not.toEqual(ladder?.start.interval90);
    expect(other.ladder?.random.seed).toBe(full.seed + 1);
  });

  it('says what is missing, in the ledger and on the ladder', () => {
    const { outcomes, ladder } = testAssumptions(logRegressionClaim(record));
    const untested = outcomes.filter(({ isTestable }) => !isTestable).map(({ id }) => id);
    expect(untested.sort()).toEqual(['like-for-like', 'omitted-forcings', 'transient-as-equilibrium']);
    expect(ladder?.rungs.map(({ assumptionId }) => assumptionId)).toEqual(['zero-intercept']);
    expect(ladder?.notApplied.map(({ assumptionId }) => assumptionId)).toEqual([
      'omitted-forcings',
      'transient-as-equilibrium',
    ]);
    expect(ladder?.notApplied.every(({ reason }) => reason.length > 40)).toBe(true);
  });

  it('says on the ladder that heat uptake on CO2 alone is half a step', () => {
    const { ladder } = testAssumptions(logRegressionClaim({ ...record, evidence: { energyBudget: ar6EnergyBudget } }));
    expect(ladder?.caveats.map(({ code }) => code)).toEqual(['budget-periods', 'co2-alone']);
  });

  it('does without the assumptions of the origin when there is an intercept', () => {
    const claim = logRegressionClaim({ ...record, procedure: { intercept: true } });
    expect(idsOf(claim)).toEqual(all.filter((id) => !['zero-intercept', 'anchor-year', 'quoted-range'].includes(id)));
    expect(testAssumptions(claim).ladder?.notApplied[0]).toEqual({
      assumptionId: 'zero-intercept',
      reason: 'The procedure has a free intercept already.',
    });
  });

  it('makes one bad input the trouble of the tests that need it, not of the others', () => {
    const series = { ...full.series, totalForcingSeriesId: annualSeries('odd', 'forcing', 'furlongs', years, x) };
    const { outcomes, ladder } = testAssumptions({ ...full, series });
    const failed = outcomes.filter(({ isTestable }) => !isTestable);
    expect(failed.map(({ id }) => id)).toEqual(['omitted-forcings']);
    expect(failed[0]?.missing).toEqual({
      reason: expect.stringMatching(/series odd: .*“furlongs”/) as string,
      wouldNeed: 'State the unit of the series.',
    });
    expect(ladder?.rungs.map(({ assumptionId }) => assumptionId)).toEqual([
      'zero-intercept',
      'transient-as-equilibrium',
    ]);
    expect(ladder?.notApplied[0]?.reason).toMatch(/furlongs/);
  });

  it('tests trends and ratios by what applies to them, without a ladder', () => {
    const trend = computationOf(
      { kind: 'trend', seriesId: 1, minMonths: 12, window: null, covariance: { kind: 'classical' }, per: 'decade' },
      { seriesId: annualSeries('air', 'temperature', 'K', years, temperatureK) },
      { unit: 'K per decade', quantity: 'trend', value: '0.06' },
    );
    expect(idsOf(trend)).toEqual(['independent-errors', 'like-for-like', 'window']);
    expect(idsOf({ ...trend, statement: { ...trend.statement, statedRSquared: '0.9' } })).toContain('r-squared');
    expect(testAssumptions(trend).ladder).toBeNull();
    const part = (value: string) => ({ value, unit: 'W/m²' });
    const ratio = computationOf(
      { kind: 'ratio', numerator: part('3.7'), denominator: part('5.35') },
      {},
      { quantity: 'ratio', unit: '1', value: '0.69' },
    );
    expect(idsOf(ratio)).toEqual(['like-for-like']);
    expect(testAssumptions(ratio).ladder).toBeNull();
  });

  it('reports progress up to the whole', () => {
    const shares: number[] = [];
    testAssumptions(full, (share) => shares.push(share));
    expect(shares).toHaveLength(10);
    expect(shares.at(-1)).toBe(1);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
  });

  it('fills every sentence with figures, none of them missing', () => {
    const texts = [full, logRegressionClaim(record), withoutRange].flatMap((claim) =>
      testAssumptions(claim).outcomes.flatMap(({ test, reading, sentence, proposal }) => [
        test,
        reading,
        sentence,
        proposal.reason,
      ]),
    );
    for (const text of texts) {
      expect(text).not.toMatch(/NaN|undefined|null|not a number|\[object|\$\{| {2}|\.\.|\( | \)/);
      expect(text.length).toBeGreaterThan(5);
    }
  });
});
