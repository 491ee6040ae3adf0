import { describe, expect, it } from 'vitest';
import { isFootingError } from '../../../src-main/errors.ts';
import { canonicalJson } from '../../../src-main/project/canonical-json.ts';
import { checkSignatures } from '../../../src-main/project/check-signatures.ts';
import { digest } from '../../../src-main/project/digest.ts';
import { fingerprint } from '../../../src-main/project/fingerprint.ts';
import type { Project } from '../../../src-main/project/project.ts';
import { signFinding } from '../../../src-main/project/sign-finding.ts';
import { verifyEd25519 } from '../../../src-main/project/verify-ed25519.ts';
import { verifyProject } from '../../../src-main/project/verify-project.ts';
import {
  addClaim,
  addFinding,
  addResult,
  doing,
  emptyProject,
  sampleSigner,
  signedProject,
} from '../../helpers/sample-project.ts';

const second = { ...doing, reviewer: { name: 'S. Example', role: 'second reviewer' } };
const info = { ...doing, action: 'change', subject: 'something' };

function codeOf(work: () => unknown): string {
  try {
    work();
  } catch (error) {
    if (isFootingError(error)) return error.fields.code;
    throw error;
  }
  return 'none';
}

function revise(project: Project, reason = 'a year was missing'): number {
  const { id: _id, ...signed } = project.list('finding').at(-1) ?? project.get('finding', 1);
  return project.command({ ...info, action: 'revise finding' }, (change) =>
    change.add('finding', { ...signed, revision: signed.revision + 1, reason, isSigned: false }),
  ).id;
}

describe('signFinding', () => {
  it('signs the finding, what it cites, the claim and the head of the trail, and freezes the finding', () => {
    const project = signedProject();
    const signature = project.get('signature', 1);
    const { previousHash, entry } = project.trailEntry(9);
    expect(entry).toMatchObject({ action: 'sign finding', subject: 'claim 1 · revision 1' });
    expect(signature).toMatchObject({
      signer: doing.reviewer,
      signedAt: doing.at,
      trailSequence: 8,
      trailHash: previousHash,
    });
    expect(project.get('finding', 1).isSigned).toBe(true);

    const payload = project.content(signature.payloadDigest);
    expect(JSON.parse(payload.toString())).toEqual({
      format: 'footing-signed-finding/1',
      finding: project.get('finding', 1),
      results: project.list('result'),
      claim: project.get('claim', 1),
      marks: project.list('mark'),
      trailHead: { sequence: 8, hash: previousHash },
      signer: { ...doing.reviewer, publicKey: sampleSigner(1).publicKey },
      meaning: 'sign-off',
      remark: '',
      signedAt: doing.at,
    });
    expect(canonicalJson(JSON.parse(payload.toString()))).toBe(payload.toString());
    expect(verifyEd25519(signature.publicKey, payload, signature.signature)).toBe(true);
    expect(checkSignatures(project)).toEqual([
      {
        signatureId: 1,
        claimId: 1,
        revision: 1,
        meaning: 'sign-off',
        signer: 'R. Example, reviewer',
        fingerprint: fingerprint(sampleSigner(1).publicKey),
        isValid: true,
        reason: null,
      },
    ]);
  });

  it('lets a second reviewer counter-sign and dissent, over the same frozen finding', () => {
    const project = signedProject();
    const finding = project.get('finding', 1);
    signFinding(project, {
      ...second,
      findingId: 1,
      meaning: 'counter-signature',
      remark: '',
      signer: sampleSigner(2),
    });
    signFinding(project, {
      ...second,
      findingId: 1,
      meaning: 'dissent',
      remark: 'Too strong.',
      signer: sampleSigner(3),
    });
    expect(project.get('finding', 1)).toEqual(finding);
    expect(checkSignatures(project).map(({ meaning, isValid, signer }) => [meaning, isValid, signer])).toEqual([
      ['sign-off', true, 'R. Example, reviewer'],
      ['counter-signature', true, 'S. Example, second reviewer'],
      ['dissent', true, 'S. Example, second reviewer'],
    ]);
    expect(project.trailLines({ limit: 2 }).map(({ action }) => action)).toEqual([
      'record dissent',
      'counter-sign finding',
    ]);
    expect(verifyProject(project.path).problems).toEqual([]);
  });

  it.each([
    ['a second sign-off', 'sign-off', 2],
    ['a counter-signature with the same key', 'counter-signature', 1],
    ['a dissent with the same key', 'dissent', 1],
  ] as const)('refuses %s', (_, meaning, seed) => {
    const project = signedProject();
    const head = project.head();
    expect(
      codeOf(() => signFinding(project, { ...second, findingId: 1, meaning, remark: '', signer: sampleSigner(seed) })),
    ).toBe('not-ready-to-sign');
    expect(project.head()).toEqual(head);
  });

  it('refuses a counter-signature before the sign-off, and a finding without a conclusion', () => {
    const project = emptyProject();
    addClaim(project);
    addFinding(project, 1);
    const sign = (meaning: 'sign-off' | 'counter-signature') =>
      signFinding(project, { ...doing, findingId: 1, meaning, remark: '', signer: sampleSigner(1) });
    expect(codeOf(() => sign('counter-signature'))).toBe('not-ready-to-sign');
    project.command(info, (change) => change.put('finding', { ...project.get('finding', 1), conclusion: null }));
    expect(codeOf(() => sign('sign-off'))).toBe('not-ready-to-sign');
    expect(project.list('signature')).toEqual([]);
  });
});

describe('what is signed', () => {
  it('cannot be changed or removed by any command', () => {
    const project = signedProject();
    const finding = project.get('finding', 1);
    const claim = project.get('claim', 1);
    const mark = project.get('mark', 1);
    const result = project.get('result', 1);
    const signature = project.get('signature', 1);
    const head = project.head();
    const attempts: ((change: Parameters<Parameters<Project['command']>[1]>[0]) => unknown)[] = [
      (change) => change.put('finding', { ...finding, text: 'Something else.' }),
      (change) => change.put('finding', { ...finding, isSigned: false }),
      (change) => change.remove('finding', 1),
      (change) => change.put('claim', { ...claim, seed: 9 }),
      (change) => change.remove('claim', 1),
      (change) => change.put('mark', { ...mark, mark: 'met' }),
      (change) => change.remove('mark', 1),
      (change) => change.add('mark', { claimId: 1, assumptionId: 'anchor-year', mark: 'met', note: '' }),
      (change) => change.put('result', { ...result, seed: 9 }),
      (change) => change.remove('result', 1),
      (change) => change.put('signature', { ...signature, remark: 'x' }),
      (change) => change.remove('signature', 1),
    ];
    for (const attempt of attempts) expect(codeOf(() => project.command(info, attempt))).toBe('frozen');
    expect(project.head()).toEqual(head);
  });

  it('leaves room for notes, new results and other claims', () => {
    const project = signedProject();
    addClaim(project);
    project.command(info, (change) => {
      change.add('note', { claimId: 1, text: 'seen', author: 'S. Example', writtenAt: doing.at });
      addResult(change, 1);
      change.add('mark', { claimId: 2, assumptionId: 'window', mark: 'met', note: '' });
      change.put('claim', { ...project.get('claim', 2), seed: 4 });
    });
    project.command(info, (change) => change.remove('result', 2));
    expect(checkSignatures(project)).toMatchObject([{ isValid: true }]);
  });

  it('stays as it is while a new revision changes what is under it', () => {
    const project = signedProject();
    const findingId = revise(project);
    project.command(info, (change) => {
      change.put('claim', { ...project.get('claim', 1), seed: 9 });
      change.put('mark', { ...project.get('mark', 1), mark: 'met' });
      change.put('finding', { ...project.get('finding', findingId), text: 'The number moves by a quarter.' });
    });
    expect(codeOf(() => project.command(info, (change) => change.remove('result', 1)))).toBe('frozen');
    expect(checkSignatures(project)).toMatchObject([{ revision: 1, isValid: true }]);
    signFinding(project, { ...doing, findingId, meaning: 'sign-off', remark: '', signer: sampleSigner(1) });
    expect(checkSignatures(project)).toMatchObject([
      { revision: 1, isValid: true },
      { revision: 2, isValid: true },
    ]);
    expect(
      codeOf(() => project.command(info, (change) => change.put('claim', { ...project.get('claim', 1), seed: 10 }))),
    ).toBe('frozen');
    expect(verifyProject(project.path).problems).toEqual([]);
  });

  it('is frozen again when the new revision is undone', () => {
    const project = signedProject();
    revise(project);
    project.undo(doing);
    expect(
      codeOf(() => project.command(info, (change) => change.put('claim', { ...project.get('claim', 1), seed: 9 }))),
    ).toBe('frozen');
    expect(checkSignatures(project)).toMatchObject([{ isValid: true }]);
  });
});

describe('fingerprint', () => {
  it('is the first 160 bits of the SHA-256 of the key, in fours', () => {
    const { publicKey } = sampleSigner(1);
    expect(fingerprint(publicKey)).toMatch(/^([0-9a-f]{4} ){9}[0-9a-f]{4}$/);
    expect(fingerprint(publicKey).replaceAll(' ', '')).toBe(digest(Buffer.from(publicKey, 'hex')).slice(0, 40));
  });
});
