import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { ClaimDraft } from '../../src-main/contract/claim.ts';
import { testCore, type TestCore } from '../helpers/test-core.ts';

/** Invented: 0.02 K a year, with a wiggle. */
const years = Array.from({ length: 40 }, (_, place) => 1980 + place);
const table = [
  'year,temp',
  ...years.map((year, place) => `${year},${(0.02 * place + 0.05 * Math.sin(place)).toFixed(3)}`),
].join('\n');
const trend: ClaimDraft = {
  title: 'Trend',
  statement: { words: 'It warms by 0.2 degrees in ten years.', quantity: 'trend', value: '0.20', unit: 'K per decade' },
  procedure: { kind: 'trend', seriesId: 'warming' },
};

describe('a claim', () => {
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
  });
  afterEach(() => test.end());

  it('finds its series by name and has defaults for the rest', async () => {
    const { claim } = await test.ask('claim.create', trend);
    expect(claim).toMatchObject({
      procedure: { seriesId: 1, minMonths: 12, window: null, per: 'decade', covariance: { kind: 'classical' } },
      tolerance: { notableShare: 0.1, decisiveShare: 0.25 },
    });
  });

  it('has defaults for a Gregory regression and for CO2 that warm water gives off', async () => {
    await test.ask('data.import', {
      fileName: 'flux.csv',
      bytes: Buffer.from(table.replace('temp', 'flux')).toString('base64'),
      options: {},
      choices: [{ key: 'flux', name: 'net-flux', quantity: 'other', unit: 'W/m²' }],
      leaveOutBadRows: false,
    });
    const statement = {
      ...trend.statement,
      quantity: 'effective-climate-sensitivity',
      unit: 'K per doubling',
    } as const;
    const gregory = await test.ask('claim.create', {
      title: 'Line',
      statement,
      procedure: { kind: 'gregory', seriesId: 'net-flux', temperatureSeriesId: 'warming' },
    });
    expect(gregory.claim.procedure).toEqual({
      kind: 'gregory',
      seriesId: 2,
      temperatureSeriesId: 1,
      minMonths: 12,
      window: null,
      split: { early: { from: 1, to: 20 }, late: { from: 21, to: 150 } },
      divisor: 2,
      covariance: { kind: 'classical' },
    });
    expect(gregory.procedureSeriesIds).toEqual([2, 1]);
    // The invented flux rises as it warms.
    const refused = await test.core.handle('claim.recompute', { claimId: gregory.claim.id, jobId: 'gregory' });
    expect(refused).toMatchObject({ ok: false, error: { kind: 'NumericError', code: 'no-finite-sensitivity' } });

    const outgassing = await test.ask('claim.create', {
      title: 'Sea',
      statement: { ...trend.statement, quantity: 'co2-change', unit: 'ppm', value: '12' },
      procedure: { kind: 'outgassing', source: 'takahashi1993', temperatureC: 15, co2Ppm: 280 },
    });
    expect(outgassing.claim.procedure).toMatchObject({ warmingK: 1, salinity: null, toPpm: null });
    const computed = await test.ask('claim.recompute', { claimId: outgassing.claim.id, jobId: 'outgassing' });
    expect(computed.recomputation?.answer.value).toBeCloseTo(280 * Math.expm1(0.0423), 10);
  });

  it('names the series there are when it cannot find the one named', async () => {
    const draft = { ...trend, procedure: { kind: 'trend' as const, seriesId: 'cooling' } };
    const refused = await test.core.handle('claim.create', draft);
    expect(refused).toMatchObject({
      ok: false,
      error: { code: 'unknown-series', where: 'procedure.seriesId', received: 'cooling' },
    });
    expect(refused.ok ? '' : refused.error.expected).toContain('warming');
  });

  it('takes the range that a source quotes, and refuses one that nobody can have printed', async () => {
    const { claim } = await test.ask('claim.create', trend);
    expect(claim.evidence.quotedRange).toBeNull();
    const withRange = (low: string | null, high: string | null) => ({
      claimId: 1,
      change: { evidence: { ...claim.evidence, quotedRange: { low, high, levelPercent: 66 } } },
    });
    const kept = await test.ask('claim.update', withRange('1.4', '2.2'));
    expect(kept.claim.evidence.quotedRange).toEqual({ low: '1.4', high: '2.2', levelPercent: 66 });
    expect(await test.core.handle('claim.update', withRange('2.2', '1.4'))).toMatchObject({
      ok: false,
      error: { code: 'quoted-range-order', where: 'evidence.quotedRange', received: '2.2 – 1.4' },
    });
    expect(await test.core.handle('claim.update', withRange(null, null))).toMatchObject({
      ok: false,
      error: { code: 'quoted-range-empty' },
    });
    expect((await test.ask('claim.view', { claimId: 1 })).claim).toEqual(kept.claim);
  });

  it('says where an input has another form, and stores nothing', async () => {
    const before = await test.ask('project.view', {});
    const refused = await test.core.handle('claim.create', {
      ...trend,
      statement: { ...trend.statement, value: 'about two' },
    });
    expect(refused).toMatchObject({ ok: false, error: { code: 'input-form', where: 'claim.create.statement.value' } });
    expect((await test.ask('project.view', {})).head).toEqual(before.head);
  });

  it('knows that a result is older than the claim, and that it is fresh again', async () => {
    await test.ask('claim.create', trend);
    expect((await test.ask('claim.recompute', { claimId: 1 })).recomputation?.isStale).toBe(false);
    const window = { start: 1985, end: 2015 };
    const procedure = {
      kind: 'trend',
      seriesId: 1,
      minMonths: 12,
      window,
      covariance: { kind: 'classical' },
      per: 'decade',
    } as const;
    expect((await test.ask('claim.update', { claimId: 1, change: { procedure } })).recomputation?.isStale).toBe(true);
    expect((await test.ask('trail.undo', {})).claims).toHaveLength(1);
    expect((await test.ask('claim.view', { claimId: 1 })).recomputation?.isStale).toBe(false);
  });

  it('does not grow stale by evidence that its recomputation does not use', async () => {
    const { claim } = await test.ask('claim.create', trend);
    await test.ask('claim.recompute', { claimId: 1 });
    const tested = await test.ask('claim.testAssumptions', { claimId: 1 });
    expect(tested.assumptions?.isStale).toBe(false);
    const evidence = { ...claim.evidence, comparedWith: 'ar6-tcr' };
    const changed = await test.ask('claim.update', { claimId: 1, change: { evidence } });
    expect(changed.recomputation?.isStale).toBe(false);
    expect(changed.assumptions?.isStale).toBe(true);
  });

  it('stores the same result once', async () => {
    await test.ask('claim.create', trend);
    await test.ask('claim.recompute', { claimId: 1 });
    const { head } = await test.ask('project.view', {});
    await test.ask('claim.recompute', { claimId: 1 });
    expect((await test.ask('project.view', {})).head).toEqual(head);
  });

  it('takes its marks, notes, findings and results along when it is removed, and brings them back', async () => {
    await test.ask('claim.create', trend);
    await test.ask('claim.recompute', { claimId: 1 });
    await test.ask('claim.mark', { claimId: 1, assumptionId: 'window', mark: 'met', note: '' });
    await test.ask('note.add', { claimId: 1, text: 'A note.' });
    await test.ask('finding.save', {
      claimId: 1,
      conclusion: 'supported',
      text: 'Yes.',
      conditions: '',
      publishedValueIds: [],
    });
    expect((await test.ask('claim.remove', { claimId: 1 })).claims).toEqual([]);
    await test.ask('trail.undo', {});
    const view = await test.ask('claim.view', { claimId: 1 });
    expect([view.marks, view.notes, view.findings].map((rows) => rows.length)).toEqual([1, 1, 1]);
    expect(view.recomputation).not.toBeNull();
    expect(await test.ask('project.verify', {})).toMatchObject({ isSound: true });
  });
});

describe('signing a finding', () => {
  let test: TestCore;
  beforeEach(async () => {
    test = await testCore();
    await test.ask('project.openDemo', {});
    await test.ask('identity.create', { passphrase: 'long enough' });
  });
  afterEach(() => test.end());

  const sign = (passphrase = 'long enough') =>
    test.core.handle('finding.sign', { claimId: 1, passphrase, meaning: 'sign-off', remark: '' });
  const save = (change: object) =>
    test.ask('claim.view', { claimId: 1 }).then(({ findings: [finding] }) => {
      const { conclusion, text, conditions, publishedValueIds } = finding ?? {
        conclusion: null,
        text: '',
        conditions: '',
        publishedValueIds: [],
      };
      return test.ask('finding.save', { claimId: 1, conclusion, text, conditions, publishedValueIds, ...change });
    });

  it.each([
    ['no conclusion', { conclusion: null }, 'a conclusion'],
    ['no words', { text: '  ' }, 'the finding in words'],
    ['conditions not stated', { conclusion: 'supported on stated conditions' }, 'the conditions'],
    ['a figure that does not exist', { text: 'It gives {slop}.' }, 'names of figures'],
    [
      '“supported” against its own decisive marks',
      { conclusion: 'supported' },
      'a conclusion that agrees with your marks',
    ],
  ])('is refused with %s', async (_, change, expected) => {
    await save(change);
    const refused = await sign();
    expect(refused).toMatchObject({ ok: false, error: { code: 'not-ready-to-sign' } });
    expect(refused.ok ? '' : refused.error.expected).toContain(expected);
  });

  it('is refused on results from before a change', async () => {
    await test.ask('claim.update', { claimId: 1, change: { seed: 7 } });
    expect(await sign()).toMatchObject({ ok: false, error: { expected: 'results of the claim as it is now' } });
  });

  it('is refused with another passphrase, or before the reviewer’s own, and leaves everything as it was', async () => {
    // A newer result, which a signature would cite.
    await test.ask('claim.sweep', { claimId: 1, minYears: 30 });
    const { head } = await test.ask('project.view', {});
    expect(await sign('not this one')).toMatchObject({ ok: false, error: { code: 'wrong-passphrase' } });
    const input = { claimId: 1, passphrase: 'long enough', meaning: 'counter-signature', remark: '' };
    expect(await test.core.handle('finding.sign', input)).toMatchObject({ error: { code: 'not-ready-to-sign' } });
    expect((await test.ask('project.view', {})).head).toEqual(head);
    expect((await test.ask('claim.view', { claimId: 1 })).isFrozen).toBe(false);
  });

  it('cites the newest results, whatever the finding was written on', async () => {
    await test.ask('claim.sweep', { claimId: 1, minYears: 30 });
    const signed = await sign();
    expect(signed.ok).toBe(true);
    const view = await test.ask('claim.view', { claimId: 1 });
    expect(view.findings[0]?.resultIds).toContain(view.sweep?.result.id);
  });
});
