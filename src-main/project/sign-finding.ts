import type { Finding, Signature, SignatureMeaning } from '../contract/finding.ts';
import { InputError } from '../errors.ts';
import { canonicalJson } from './canonical-json.ts';
import type { Signer } from './identity.ts';
import type { Doing, Project } from './project.ts';
import { signedStatement, type SignedStatement } from './signed-statement.ts';

export interface Signing extends Doing {
  findingId: number;
  meaning: SignatureMeaning;
  remark: string;
  signer: Signer;
}

const actions: Record<SignatureMeaning, string> = {
  'sign-off': 'sign finding',
  'counter-signature': 'counter-sign finding',
  dissent: 'record dissent',
};

/**
 * Signs a finding with the reviewer's key and freezes it, in one command. The first signature on a finding is a
 * sign-off; whoever holds another key may then counter-sign it or record a dissent, over the same frozen finding.
 *
 * @throws InputError not-ready-to-sign, no-such-record
 */
export function signFinding(project: Project, { findingId, meaning, remark, signer, ...doing }: Signing): Signature {
  const finding = project.get('finding', findingId);
  const { claimId, revision } = finding;
  const earlier = project.list('signature').filter((signature) => signature.findingId === findingId);
  refuseUnready(finding, meaning, earlier, signer.publicKey);

  const { at: signedAt, reviewer } = doing;
  const subject = `claim ${claimId} · revision ${revision}`;
  return project.command({ ...doing, action: actions[meaning], subject }, (change) => {
    const frozen = finding.isSigned ? finding : change.put('finding', { ...finding, isSigned: true });
    const trailHead = project.head();
    const statement: SignedStatement = {
      format: 'footing-signed-finding/1',
      finding: frozen,
      results: frozen.resultIds.map((resultId) => project.get('result', resultId)),
      claim: project.get('claim', claimId),
      marks: project.list('mark').filter((mark) => mark.claimId === claimId),
      trailHead,
      signer: { ...reviewer, publicKey: signer.publicKey },
      meaning,
      remark,
      signedAt,
    };
    const payload = Buffer.from(canonicalJson(signedStatement.parse(statement)));
    return change.add('signature', {
      claimId,
      findingId,
      revision,
      meaning,
      remark,
      signer: reviewer,
      signedAt,
      publicKey: signer.publicKey,
      trailSequence: trailHead.sequence,
      trailHash: trailHead.hash,
      payloadDigest: change.addContent(payload),
      signature: signer.sign(payload),
    });
  });
}

function refuseUnready(finding: Finding, meaning: SignatureMeaning, earlier: Signature[], publicKey: string): void {
  const refuse = (expected: string, received: string, hint?: string): never => {
    const where = `Finding on claim ${finding.claimId}, revision ${finding.revision}`;
    throw new InputError({ code: 'not-ready-to-sign', where, expected, received, ...(hint && { hint }) });
  };
  if (finding.conclusion === null) refuse('a conclusion', 'none chosen');
  if (meaning === 'sign-off') {
    if (finding.isSigned)
      refuse('a finding without a signature', 'a signed one', 'Counter-sign it, record a dissent, or revise it.');
    return;
  }
  if (!finding.isSigned) refuse(`a finding that its reviewer has signed, before a ${meaning}`, 'an unsigned one');
  if (earlier.some((signature) => signature.publicKey === publicKey)) {
    refuse(
      'a reviewer with another key than those who have signed',
      'one of their keys',
      'This is for a second reviewer.',
    );
  }
}
