import { describe, expect, it } from 'vitest';
import type { Signature } from '../../../src-main/contract/finding.ts';
import type { RecordKind } from '../../../src-main/contract/trail.ts';
import { canonicalJson } from '../../../src-main/project/canonical-json.ts';
import { checkSignature, type SignatureEvidence } from '../../../src-main/project/check-signatures.ts';
import { digest } from '../../../src-main/project/digest.ts';
import type { Project } from '../../../src-main/project/project.ts';
import { sampleSigner, signedProject } from '../../helpers/sample-project.ts';

type Records = Partial<Record<RecordKind, Record<string, unknown>[]>>;

/** The evidence that a sound project gives, with some of it replaced. */
function evidenceOf(
  project: Project,
  replaced: Records = {},
  others: Partial<SignatureEvidence> = {},
): SignatureEvidence {
  return {
    records: (kind) => replaced[kind] ?? project.list(kind),
    content: (name) => project.content(name),
    entryHash: (sequence) => project.trailEntry(sequence).hash,
    ...others,
  };
}

/** The signature with another statement under it, signed well. */
function signAgain(project: Project, change: (statement: Record<string, unknown>) => Record<string, unknown>) {
  const signature = project.get('signature', 1);
  const payload = Buffer.from(
    canonicalJson(change(JSON.parse(project.content(signature.payloadDigest).toString()) as Record<string, unknown>)),
  );
  const signed = { ...signature, payloadDigest: digest(payload), signature: sampleSigner(1).sign(payload) };
  const content = (name: string) => (name === signed.payloadDigest ? payload : project.content(name));
  return { signed, content };
}

describe('checkSignature', () => {
  const project = signedProjectForAll();

  it('accepts what was signed', () => {
    const { signature, evidence } = project();
    expect(checkSignature(signature, evidence())).toMatchObject({ isValid: true, reason: null });
  });

  it.each([
    [
      'the finding changed',
      { finding: [['text', 'Something else.']] },
      /^the finding changed since: \$\.text was "The number moves by a third\." and is "Something else\."$/,
    ],
    [
      'the finding is no longer frozen',
      { finding: [['isSigned', false]] },
      /^the finding changed since: \$\.isSigned was true and is false$/,
    ],
    ['a cited result changed', { result: [['seed', 4]] }, /^result 1 changed since: \$\.seed was null and is 4$/],
    ['the claim changed', { claim: [['seed', 4]] }, /^the claim changed since: \$\.seed was 1 and is 4$/],
    [
      'a mark changed',
      { mark: [['mark', 'met']] },
      /^the marks on its assumptions changed since: \$\[0\]\.mark was "not met" and is "met"$/,
    ],
  ] as const)('says that %s', (_, changes, reason) => {
    const { signature, evidence, records } = project();
    const replaced: Records = {};
    for (const [kind, [[key, value]]] of Object.entries(changes) as unknown as [RecordKind, [[string, unknown]]][]) {
      replaced[kind] = records(kind).map((record) => ({ ...record, [key]: value }));
    }
    const check = checkSignature(signature, evidence(replaced));
    expect(check.isValid).toBe(false);
    expect(check.reason).toMatch(reason);
  });

  it('says that finding, result, answer or statement are gone', () => {
    const { signature, evidence, answerDigest } = project();
    const reasonWith = (replaced: Records, others: Partial<SignatureEvidence> = {}) =>
      checkSignature(signature, evidence(replaced, others)).reason;
    expect(reasonWith({ finding: [] })).toBe('the finding is gone');
    expect(reasonWith({ result: [] })).toMatch(/^result 1 changed since: \$ was \{.*\} and is nothing$/);
    const without = (gone: string) => ({
      content: (name: string) => (name === gone ? undefined : evidence().content(name)),
    });
    expect(reasonWith({}, without(answerDigest))).toBe('the answer of result 1 is missing or was altered');
    expect(reasonWith({}, without(signature.payloadDigest))).toBe('the signed statement is missing or was altered');
  });

  it('says that the trail was rewritten', () => {
    const { signature, evidence } = project();
    const reason = 'the trail no longer has the entry 8 that was its last when this was signed';
    expect(checkSignature(signature, evidence({}, { entryHash: () => 'f'.repeat(64) })).reason).toBe(reason);
    expect(checkSignature(signature, evidence({}, { entryHash: () => undefined })).reason).toBe(reason);
  });

  it('says that the key is another one', () => {
    const { signature, evidence } = project();
    const reason = 'the signature was not made over this statement with this key';
    expect(checkSignature({ ...signature, publicKey: sampleSigner(2).publicKey }, evidence()).reason).toBe(reason);
    expect(checkSignature({ ...signature, signature: '0'.repeat(128) }, evidence()).reason).toBe(reason);
  });

  it.each([
    ['name', { signer: { name: 'S. Example', role: 'reviewer' } }, '$.signer.name'],
    ['time', { signedAt: '2026-01-02T03:04:05.679Z' }, '$.signedAt'],
    ['meaning', { meaning: 'dissent' }, '$.meaning'],
    ['remark', { remark: 'well done' }, '$.remark'],
    ['head', { trailSequence: 7 }, '$.trailSequence'],
  ] satisfies [string, Partial<Signature>, string][])(
    'says that the %s beside the signature is not the signed one',
    (_, change, path) => {
      const { signature, evidence } = project();
      expect(checkSignature({ ...signature, ...change }, evidence()).reason).toContain(
        `the signature’s own record changed since: ${path} was`,
      );
    },
  );

  it('does not take a statement of another form, or a key other than the signed one, however well signed', () => {
    const { evidence, open } = project();
    const other = signAgain(open, (statement) => ({ ...statement, format: 'something-else/1' }));
    expect(checkSignature(other.signed, evidence({}, { content: other.content })).reason).toBe(
      'what was signed is not a statement that Footing makes',
    );
    const more = signAgain(open, (statement) => ({ ...statement, more: true }));
    expect(checkSignature(more.signed, evidence({}, { content: more.content })).reason).toBe(
      'what was signed is not a statement that Footing makes',
    );
    const key = signAgain(open, (statement) => ({
      ...statement,
      signer: { ...(statement['signer'] as object), publicKey: sampleSigner(2).publicKey },
    }));
    expect(checkSignature(key.signed, evidence({}, { content: key.content })).reason).toContain('$.publicKey');
  });
});

function signedProjectForAll() {
  return () => {
    const open = signedProject();
    return {
      open,
      signature: open.get('signature', 1),
      answerDigest: open.get('result', 1).answerDigest,
      records: (kind: RecordKind) => open.list(kind) as Record<string, unknown>[],
      evidence: (replaced: Records = {}, others: Partial<SignatureEvidence> = {}) => evidenceOf(open, replaced, others),
    };
  };
}
