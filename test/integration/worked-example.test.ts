import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { cautions } from '../../src-main/contract/cautions.ts';
import type { ClaimView } from '../../src-main/contract/project.ts';
import { requests } from '../../src-main/contract/requests.ts';
import { testCore, type TestCore } from '../helpers/test-core.ts';

/** The sensitivity that made the invented data: see demo-projects/vessmark-harbour/generate.ts. */
const trueEcsK = 3;

describe('the worked example', () => {
  let test: TestCore;
  let sheet: ClaimView;

  beforeAll(async () => {
    test = await testCore();
    await test.ask('project.openDemo', {});
    sheet = await test.ask('claim.view', { claimId: 1 });
  });
  afterAll(() => test.end());

  it('reproduces the stated number within the rounding of its digits', () => {
    const { agreement, value } = sheet.recomputation?.answer ?? {};
    expect(agreement?.isReproduced).toBe(true);
    expect(value).toBeGreaterThanOrEqual(1.85);
    expect(value).toBeLessThan(1.95);
  });

  it('ends its ladder on an effective sensitivity whose range holds the truth, which the stated limit does not', () => {
    const last = sheet.assumptions?.answer.ladder?.rungs.at(-1);
    expect(last?.quantity).toBe('effective-climate-sensitivity');
    expect(last?.interval90.low).toBeLessThan(trueEcsK);
    expect(last?.interval90.high ?? Infinity).toBeGreaterThan(trueEcsK);
    expect(sheet.statedValue).toBeLessThan(trueEcsK);
  });

  it('sees that the stated R² is the one about zero', () => {
    const diagnostics = sheet.recomputation?.answer.fit?.diagnostics;
    expect(diagnostics?.rSquaredUncentred).toBeCloseTo(0.91, 2);
    expect(diagnostics?.rSquaredCentred).toBeLessThan(0.9);
    expect(sheet.assumptions?.answer.outcomes.find(({ id }) => id === 'r-squared')?.reading).toMatch(/zero|uncentred/);
  });

  it('fills every figure that the findings name', async () => {
    for (const claimId of [1, 2]) {
      const view = await test.ask('claim.view', { claimId });
      const names = [...(view.findings[0]?.text ?? '').matchAll(/\{([^}]*)\}/g)].map(([, name]) => name);
      expect(names.length).toBeGreaterThan(0);
      expect(Object.keys(view.fillIns)).toEqual(expect.arrayContaining(names));
    }
  });

  it('answers in the form of the contract', async () => {
    requests['claim.view'].answer.parse(sheet);
    requests['project.view'].answer.parse(await test.ask('project.view', {}));
    requests['report.render'].answer.parse(await test.ask('report.render', {}));
  });

  it('goes on to a signature, a report, a sound file and identical results', async () => {
    await test.ask('identity.create', { passphrase: 'an invented passphrase' });
    const signed = await test.ask('finding.sign', {
      claimId: 1,
      passphrase: 'an invented passphrase',
      meaning: 'sign-off',
      remark: '',
    });
    expect(signed.isFrozen).toBe(true);
    expect(signed.signatureChecks).toMatchObject([
      { isValid: true, signer: 'Ilse Varrow-Oyelaran, reviewer (invented)' },
    ]);

    const { files } = await test.ask('report.write', {
      directory: join(test.folder, 'report'),
      formats: ['html', 'json'],
    });
    expect(files.every((file) => existsSync(file))).toBe(true);
    const html = readFileSync(files[0] ?? '', 'utf8');
    for (const caution of cautions) expect(html).toContain(caution.slice(0, 40));
    expect(html).toContain('invented');

    expect(await test.ask('project.verify', {})).toMatchObject({ isSound: true, problems: [] });
    expect(await test.ask('project.recheck', {})).toMatchObject({ isIdentical: true, nResults: 9 });
  });

  it('keeps a signed sheet as it was signed, and lets a new revision begin', async () => {
    const refused = await test.core.handle('claim.mark', { claimId: 1, assumptionId: 'window', mark: 'met', note: '' });
    expect(refused).toMatchObject({ ok: false, error: { code: 'signed' } });
    const revised = await test.ask('finding.revise', { claimId: 1, reason: 'The provider corrected 1998 (invented).' });
    expect(revised.isFrozen).toBe(false);
    expect(revised.findings).toMatchObject([
      { revision: 1, isSigned: true },
      { revision: 2, isSigned: false },
    ]);
    expect(revised.signatureChecks).toMatchObject([{ isValid: true, revision: 1 }]);
  });

  it('gives the same digits when it is made again', async () => {
    const again = await testCore();
    await again.ask('project.openDemo', {});
    const view = await again.ask('claim.view', { claimId: 1 });
    expect(view.assumptions?.result.answerDigest).toBe(sheet.assumptions?.result.answerDigest);
    expect(view.recomputation?.result.answerDigest).toBe(sheet.recomputation?.result.answerDigest);
    expect(view.sweep?.result.answerDigest).toBe(sheet.sweep?.result.answerDigest);
    await again.end();
  });
});
