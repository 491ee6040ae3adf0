import { describe, expect, it } from 'vitest';
import { cautions } from '../../../src-main/contract/cautions.ts';
import FindingSection from '../../../src-renderer/sheet/FindingSection.vue';
import { Refusal } from '../../helpers/fake-host.ts';
import { inventedSession } from '../../helpers/invented-project.ts';
import { button, field, settled } from '../../helpers/mount-screen.ts';
import { inventedSheet, mountOnSheet } from '../../helpers/sheet-screen.ts';
import { inventedClaim } from '../../unit/report/invented-report.ts';

const view = inventedSheet();
const [draft] = view.findings;
const signed = inventedSheet({
  findings: [{ ...draft!, isSigned: true }],
  isFrozen: true,
  signatures: inventedClaim.signatures.map(({ signature }) => ({ ...signature, findingId: draft!.id })),
  signatureChecks: inventedClaim.signatures.map(({ check }) => check),
});
const withKey = { ...inventedSession, reviewer: { ...inventedSession.reviewer!, publicKey: 'd'.repeat(64) } };

const mounted = (change = {}) =>
  mountOnSheet(FindingSection, {
    view: inventedSheet(change),
    prepare: (host) => host.reply('finding.save', () => inventedSheet(change)),
  });

describe('the finding', () => {
  it('is shown as it will be read, and unknown names stand out', async () => {
    const { screen } = await mounted();
    expect(screen.get('blockquote').text()).toBe('The slope gives 1.87 ± 0.07 K per doubling.');
    await field(screen, 'The finding, in your words').setValue('It gives {recomputed}, or {nothing}.');
    expect(screen.get('blockquote mark').text()).toBe('{nothing}');
  });

  it('carries every caution where it is made', async () => {
    const { screen } = await mounted();
    for (const caution of cautions) expect(screen.text()).toContain(caution);
  });

  it('is stored whole whenever one part of it changes', async () => {
    const { screen, host } = await mounted();
    await screen.get('input[value="supported on stated conditions"]').setValue();
    await settled();
    await field(screen, 'The conditions').setValue('for the record so far');
    await settled();
    expect(host.inputs('finding.save').at(-1)).toEqual({
      claimId: 1,
      conclusion: 'supported on stated conditions',
      text: 'The slope gives {recomputed}.',
      conditions: 'for the record so far',
      publishedValueIds: ['ar6-ecs', 'ar6-tcr'],
    });
  });

  it('quotes the published ranges that are ticked', async () => {
    const { screen, host } = await mounted();
    await screen.get('[aria-label="Quote AR6 assessed ECS"]').setValue(false);
    await settled();
    expect(host.inputs('finding.save').at(-1)?.publishedValueIds).toEqual(['ar6-tcr']);
  });

  it('takes a figure in where the cursor stands', async () => {
    const { screen, host } = await mounted();
    const area = field(screen, 'The finding, in your words');
    await area.setValue('Stated:  or so.');
    (area.element as HTMLTextAreaElement).setSelectionRange(8, 8);
    await button(screen, '{stated}').trigger('click');
    await settled();
    expect(host.inputs('finding.save').at(-1)?.text).toBe('Stated: {stated} or so.');
  });
});

describe('the sign-off', () => {
  it('makes a key at the first need, and then signs', async () => {
    const { screen, host } = await mountOnSheet(FindingSection, {
      prepare(fake) {
        fake.reply('identity.create', () => ({ ...withKey.reviewer }));
        fake.reply('finding.sign', () => signed);
      },
    });
    const sign = button(screen, 'Sign the finding');
    await field(screen, 'Passphrase for your new signing key').setValue('wet herons');
    expect(sign.attributes('disabled')).toBeDefined();
    await field(screen, 'The same again').setValue('wet heron');
    expect(screen.text()).toContain('The two are not the same.');
    await field(screen, 'The same again').setValue('wet herons');
    await sign.trigger('click');
    await settled();
    expect(host.inputs('identity.create')).toEqual([{ passphrase: 'wet herons' }]);
    expect(host.inputs('finding.sign')).toEqual([
      { claimId: 1, passphrase: 'wet herons', meaning: 'sign-off', remark: '' },
    ]);
    expect(screen.get('h2').text()).toBe('Finding signed');
  });

  it('says what is wrong, and keeps the remark', async () => {
    const { screen } = await mountOnSheet(FindingSection, {
      session: withKey,
      prepare: (fake) =>
        fake.reply('finding.sign', () => {
          throw new Refusal({ code: 'wrong-passphrase', where: 'Signing key', hint: 'Try again.' });
        }),
    });
    await field(screen, 'Remark, signed with it').setValue('Read twice.');
    await field(screen, 'Passphrase of your signing key').setValue('another one');
    await button(screen, 'Sign the finding').trigger('click');
    await settled();
    expect(screen.get('[role=alert]').text()).toContain('Try again.');
    expect((field(screen, 'Remark, signed with it').element as HTMLTextAreaElement).value).toBe('Read twice.');
  });

  it('shows who signed as what, and whether it holds', async () => {
    const [first, second] = signed.signatureChecks;
    const { screen } = await mountOnSheet(FindingSection, {
      view: { ...signed, signatureChecks: [first!, { ...second!, isValid: false, reason: 'the finding was altered' }] },
      session: withKey,
    });
    expect(screen.text()).toContain('Tove Quillfeather, reviewer · sign-off · 2031-03-03, 14:06 UTC');
    expect(screen.text()).toContain('The signature holds.');
    expect(screen.text()).toContain('The signature does not hold: the finding was altered');
    expect(field(screen, 'The finding, in your words').attributes('disabled')).toBeDefined();
  });

  it('lets a second reviewer dissent, and a new revision begin with a reason', async () => {
    const { screen, host } = await mountOnSheet(FindingSection, {
      view: signed,
      session: withKey,
      prepare(fake) {
        fake.reply('finding.sign', () => signed);
        fake.reply('finding.revise', () => view);
      },
    });
    await screen.get('input[value="dissent"]').setValue();
    await field(screen, 'Passphrase of your signing key').setValue('wet herons');
    await button(screen, 'Record the dissent').trigger('click');
    await settled();
    expect(host.inputs('finding.sign')[0]?.meaning).toBe('dissent');
    const start = button(screen, 'Start revision 2');
    expect(start.attributes('disabled')).toBeDefined();
    await field(screen, 'Start a new revision: what changes, and why').setValue('A slide was added.');
    await start.trigger('click');
    await settled();
    expect(host.inputs('finding.revise')).toEqual([{ claimId: 1, reason: 'A slide was added.' }]);
    expect(screen.get('h2').text()).toBe('Finding draft');
  });
});
