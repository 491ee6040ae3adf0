import { describe, expect, it } from 'vitest';
import { likeForLike } from '../../../src-main/assumptions/like-for-like.ts';
import { testContext } from '../../../src-main/assumptions/test-context.ts';
import type { Statement } from '../../../src-main/contract/claim.ts';
import type { ClaimComputation } from '../../../src-main/contract/compute.ts';
import { annualSeries, computationOf } from '../../helpers/claim-computation.ts';
import { expectClose } from '../../helpers/close.ts';
import { ar6EnergyBudget, inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

const { years, co2Ppm, x } = inventedCo2(60);
const record = { years, co2Ppm, temperatureK: x.map((value) => (1.9 / Math.LN2) * value) };
const exact = { rel: 1e-9, abs: 0, why: 'the record is exact to rounding' };
const ratio = 2.2 / 1.61;

const outcomeFor = (statement: Partial<Statement>, evidence: Partial<ClaimComputation['evidence']> = {}) =>
  likeForLike.test(testContext(logRegressionClaim({ ...record, statement, evidence })));

const ratioClaim = (
  statement: Partial<Statement>,
  evidence: Partial<ClaimComputation['evidence']> = {},
): ClaimComputation => {
  const part = (value: string) => ({ value, unit: '' });
  const claim = computationOf(
    { kind: 'ratio', numerator: part('4.05'), denominator: part('1.61') },
    {},
    { value: '2.5', ...statement },
  );
  return { ...claim, evidence: { ...claim.evidence, ...evidence } };
};

describe('like-for-like', () => {
  it('converts a transient number to what it is presented as, and the published range back', () => {
    const outcome = outcomeFor(
      { presentedAs: 'equilibrium-climate-sensitivity' },
      { energyBudget: ar6EnergyBudget, comparedWith: 'ar6-ecs' },
    );
    expectClose(outcome.alternative?.value, 1.9 * ratio, exact);
    expect(outcome.alternative?.quantity).toBe('effective-climate-sensitivity');
    expectClose(outcome.effect, 1.9 * (ratio - 1), exact);
    expect(outcome.proposal.mark).toBe('not met');
    // AR6 very likely 2 – 5, divided by 1.366.
    expect(outcome.reading).toContain('5–95 %');
    expect(outcome.reading).toMatch(/2\.0 – 5\.0.*as a transient number by the same budget 1\.5 – 3\.7/);
    expect(outcome.reading).toMatch(/pattern of warming\.$/);
  });

  it('converts an equilibrium number down', () => {
    const claim = ratioClaim(
      { quantity: 'effective-climate-sensitivity', presentedAs: 'transient-climate-response' },
      { energyBudget: ar6EnergyBudget },
    );
    const { alternative } = likeForLike.test(testContext(claim));
    expectClose(alternative?.value, 4.05 / 1.61 / ratio, exact);
    expect(alternative?.quantity).toBe('transient-climate-response');
    expect(alternative?.interval?.low).toBeLessThan(alternative?.value ?? NaN);
  });

  it('finds a mismatch without an energy budget too, and converts nothing', () => {
    const outcome = outcomeFor({ presentedAs: 'equilibrium-climate-sensitivity' });
    expect(outcome).toMatchObject({
      isTestable: true,
      alternative: null,
      effect: null,
      weight: null,
      proposal: { mark: 'not met' },
    });
    expect(outcome.reading).toMatch(/With an energy budget the number could be converted/);
  });

  it.each([
    ['transient-climate-response', /the forcings other than CO₂/],
    ['trend', /no conversion/],
  ] as const)('gives no factor between an apparent sensitivity and %s', (presentedAs, why) => {
    const outcome = outcomeFor({ presentedAs }, { energyBudget: ar6EnergyBudget });
    expect(outcome.alternative).toBeNull();
    expect(outcome.reading).toMatch(why);
  });

  it('gives none between effective and equilibrium sensitivity', () => {
    const claim = ratioClaim(
      { quantity: 'effective-climate-sensitivity', presentedAs: 'equilibrium-climate-sensitivity' },
      { energyBudget: ar6EnergyBudget },
    );
    expect(likeForLike.test(testContext(claim)).reading).toMatch(
      /change of feedback with the pattern of warming; no conversion/,
    );
  });

  it('accepts like with like', () => {
    const claim = ratioClaim({ quantity: 'transient-climate-response' }, { comparedWith: 'ar6-tcr' });
    const outcome = likeForLike.test(testContext(claim));
    expect(outcome).toMatchObject({ isTestable: true, alternative: null, proposal: { mark: 'met' } });
    expect(outcome.table?.rows.some((row) => row[1] === 'AR6 assessed TCR')).toBe(true);
  });

  it('takes the quantity that the statement names for what it is presented as', () => {
    expect(outcomeFor({ quantity: 'transient-climate-response' }).test).toBe(
      'apparent sensitivity presented as transient climate response',
    );
    expect(outcomeFor({}, { comparedWith: 'ar6-ecs' }).test).toBe(
      'apparent sensitivity held against equilibrium climate sensitivity',
    );
  });

  it('asks when the statement leaves it open, for every kind of claim', () => {
    const trend = computationOf(
      { kind: 'trend', seriesId: 1, minMonths: 12, window: null, covariance: { kind: 'classical' }, per: 'decade' },
      { seriesId: annualSeries('air', 'temperature', 'K', years, record.temperatureK) },
      { unit: 'K per decade', quantity: 'trend', value: '0.2' },
    );
    for (const claim of [logRegressionClaim(record), trend, ratioClaim({ quantity: 'ratio' })]) {
      expect(likeForLike.applies(claim)).toBe(true);
      expect(likeForLike.test(testContext(claim))).toMatchObject({ isTestable: false, proposal: { mark: 'untested' } });
    }
  });

  it('refuses a published value that it does not know', () => {
    expect(() => outcomeFor({}, { comparedWith: 'no-such-range' })).toThrow(/“no-such-range”/);
  });
});
