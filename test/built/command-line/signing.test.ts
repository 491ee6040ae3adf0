import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { cautions } from '../../../src-main/contract/cautions.ts';
import { footing, footingHere, jsonOf, passphrase } from '../../helpers/command-line.ts';
import { decisiveAssumptions, prepareReview, project, workingFolder } from '../../helpers/review-folder.ts';

interface Verified {
  head: { sequence: number; hash: string };
}

describe('signing with the built command line', () => {
  const folder = workingFolder();
  const run = (...line: string[]) => footing(folder, [...line, '--json']);
  beforeAll(async () => {
    await prepareReview(folder);
    for (const id of decisiveAssumptions) await jsonOf(footingHere, folder, ['mark', project, id, 'untested']);
  });

  it('refuses a short passphrase before there is a key', async () => {
    expect(await footing(folder, ['sign', project], { environment: { FOOTING_PASSPHRASE: 'short' } })).toMatchObject({
      status: 2,
      errors: expect.stringMatching(/passphrase: expected text with a length of at least 8/) as string,
    });
  });

  it('makes a key, signs the finding and freezes it, and shows the passphrase to nobody', async () => {
    const signed = await run('sign', project, '--remark', 'Invented.');
    expect(signed).toMatchObject({ status: 0, errors: expect.stringMatching(/^Made a signing key: /) as string });
    expect(JSON.parse(signed.out)).toMatchObject({ claimId: 1, revision: 1, meaning: 'sign-off', remark: 'Invented.' });
    expect(signed.out + signed.errors).not.toContain(passphrase);
    const frozen = await run('mark', project, 'window', 'met');
    expect(frozen).toMatchObject({ status: 2, errors: expect.stringMatching(/signed and frozen/) as string });
  });

  it('is witnessed by the report, whose trail head is the one that verify prints', async () => {
    const written = await run('report', project, '--out', 'out/report', '--format', 'html,json');
    const files = ['html', 'json'].map((format) => join(folder, 'out', 'report', `report.${format}`));
    expect(JSON.parse(written.out)).toEqual(files);
    const [html = '', json = ''] = files.map((file) => readFileSync(file, 'utf8'));
    for (const caution of cautions) expect(html).toContain(caution.slice(0, 40));
    const { head } = JSON.parse(json) as Verified;
    const verified = JSON.parse((await run('verify', project)).out) as Verified;
    expect(verified).toMatchObject({ isSound: true, problems: [], signatures: [{ isValid: true, claimId: 1 }] });
    expect(head).toEqual(verified.head);
    // Long digests are set in groups that a line can break between.
    const groups = verified.head.hash.match(/.{8}/g) ?? [];
    expect(html).toContain(groups.map((group) => `<span>${group}</span>`).join('<wbr />'));
  });

  it('stays valid through a recheck and a revision, all of which the trail tells', async () => {
    expect(JSON.parse((await run('recheck', project)).out)).toMatchObject({ nResults: 3, isIdentical: true });
    const trail = JSON.parse((await run('trail', project, '--limit', '2')).out) as object[];
    expect(trail).toHaveLength(2);
    expect(trail[0]).toMatchObject({ action: 'sign finding', reviewer: { name: 'Ilse Varrow-Oyelaran' } });
    expect(await run('revise', project, '--reason', 'A later data version.')).toMatchObject({ status: 0 });
    expect(JSON.parse((await run('verify', project)).out)).toMatchObject({
      isSound: true,
      signatures: [{ isValid: true }],
    });
  });
});
