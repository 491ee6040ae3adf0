import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { ClaimDraft } from '../../src-main/contract/claim.ts';
import { testCore, type TestCore } from '../helpers/test-core.ts';

/** Invented: 0.02 K a year with a wiggle; one year missing. */
const years = Array.from({ length: 40 }, (_, place) => 1980 + place);
const table = [
  'year,temp',
  ...years.map((year, place) => `${year},${place === 12 ? '' : (0.02 * place + 0.05 * Math.sin(place)).toFixed(3)}`),
].join('\n');
const trend: ClaimDraft = {
  title: 'Trend',
  statement: { words: 'It warms by 0.2 degrees in ten years.', quantity: 'trend', value: '0.20', unit: 'K per decade' },
  procedure: { kind: 'trend', seriesId: 'warming' },
};

describe('the comparison of estimators of a claim', () => {
  let test: TestCore;
  beforeEach(async () => {
    test = await testCore();
    await test.ask('project.create', { title: 'Claims' });
    await test.ask('data.import', {
      fileName: 'warming.csv',
      bytes: Buffer.from(table).toString('base64'),
      options: {},
      choices: [{ key: 'temp', name: 'warming', unit: 'K' }],
      leaveOutBadRows: false,
    });
    await test.ask('claim.create', trend);
  });
  afterEach(() => test.end());

  const compare = () => test.ask('claim.compareEstimators', { claimId: 1 });

  it('is stored once, with an entry of its own, and can be run again to the last digit', async () => {
    const { estimators, trail } = await compare();
    expect(estimators).toMatchObject({ isStale: false, result: { method: 'estimators', seed: 20_261 } });
    expect(estimators?.answer.nObs).toBe(39);
    expect(estimators?.answer.gaps.years).toEqual([1992]);
    expect(trail[0]).toMatchObject({ action: 'compare estimators', subject: 'claim 1' });
    const { head } = await test.ask('project.view', {});
    await compare();
    expect((await test.ask('project.view', {})).head).toEqual(head);
    expect(await test.ask('project.recheck', {})).toMatchObject({ isIdentical: true, nResults: 1 });
  });

  it('answers footing compute alike', async () => {
    const { estimators } = await compare();
    const { values, series } = await test.ask('series.get', { seriesId: 1 });
    const { claim } = await test.ask('claim.view', { claimId: 1 });
    const { name, quantity, agent, unit, step, baseline, partialYears } = series;
    const answer = await test.core.handle('compute', {
      method: 'estimators',
      statement: claim.statement,
      procedure: claim.procedure,
      tolerance: claim.tolerance,
      seed: claim.seed,
      evidence: { energyBudget: null, comparedWith: null, quotedRange: null, doublingWm2: null },
      series: { seriesId: { name, quantity, agent, unit, step, baseline, partialYears, values } },
    });
    expect(answer).toEqual({ ok: true, value: estimators?.answer });
  });

  it('grows stale with the procedure, not with evidence, and holds a signature up until it is fresh', async () => {
    const { claim } = await compare();
    await test.ask('claim.recompute', { claimId: 1 });
    const evidence = { ...claim.evidence, comparedWith: 'ar6-tcr' };
    const kept = await test.ask('claim.update', { claimId: 1, change: { evidence } });
    expect(kept.estimators?.isStale).toBe(false);
    expect(kept.sections.recomputation).toBe('done');

    const covariance = { kind: 'newey-west', lag: 2, smallSample: false } as const;
    if (claim.procedure?.kind !== 'trend') throw new Error('the claim is a trend');
    const changed = await test.ask('claim.update', {
      claimId: 1,
      change: { procedure: { ...claim.procedure, covariance } },
    });
    expect(changed.estimators?.isStale).toBe(true);
    const fresh = await test.ask('claim.recompute', { claimId: 1 });
    expect(fresh.sections.recomputation).toBe('in progress');
    await test.ask('claim.testAssumptions', { claimId: 1 });
    await test.ask('identity.create', { passphrase: 'long enough' });
    const finding = { conclusion: 'cannot be determined', text: 'Open.', conditions: '' } as const;
    await test.ask('finding.save', { claimId: 1, ...finding, publishedValueIds: [] });
    const sign = () =>
      test.core.handle('finding.sign', { claimId: 1, passphrase: 'long enough', meaning: 'sign-off', remark: '' });
    expect(await sign()).toMatchObject({ ok: false, error: { expected: 'results of the claim as it is now' } });

    const { estimators } = await compare();
    expect((await sign()).ok).toBe(true);
    const { findings } = await test.ask('claim.view', { claimId: 1 });
    expect(findings[0]?.resultIds).toContain(estimators?.result.id);
    expect(await test.core.handle('claim.compareEstimators', { claimId: 1 })).toMatchObject({
      ok: false,
      error: { code: 'signed' },
    });
  });

  it('stands in the report, and in the words of a finding', async () => {
    const { fillIns } = await compare();
    expect(fillIns['estimators-range']).toMatch(/^0\.\d\d to 0\.\d\d K per decade$/);
    const { report, html } = await test.ask('report.render', {});
    expect(report.claims[0]?.estimators?.estimates.map(({ id }) => id)).toContain('gls-ar1-reml');
    expect(html).toContain('AR(1), Prais–Winsten');
    expect(html).toContain('without the calendar distance');
  });

  it('is refused for a ratio', async () => {
    const { claim } = await test.ask('claim.create', {
      title: 'Ratio',
      statement: { words: 'It is 1.9.', quantity: 'ratio', value: '1.9', unit: '1' },
      procedure: { kind: 'ratio', numerator: { value: '3.8', unit: '' }, denominator: { value: '2', unit: '' } },
    });
    expect(await test.core.handle('claim.compareEstimators', { claimId: claim.id })).toMatchObject({
      ok: false,
      error: { code: 'no-line' },
    });
  });
});
