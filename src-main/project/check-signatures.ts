import type { Signature, SignatureCheck } from '../contract/finding.ts';
import type { RecordKind } from '../contract/trail.ts';
import { canonicalJson } from './canonical-json.ts';
import { fingerprint } from './fingerprint.ts';
import { firstDifference } from './first-difference.ts';
import type { Project } from './project.ts';
import { signedStatement, type SignedStatement } from './signed-statement.ts';
import { verifyEd25519 } from './verify-ed25519.ts';

/** What a signature is held against; the values are unchecked, since the file may have been altered. */
export interface SignatureEvidence {
  /** All records of a kind. */
  records(kind: RecordKind): Record<string, unknown>[];
  /** undefined when there are no bytes of this digest, or others under its name. */
  content(contentDigest: string): Uint8Array | undefined;
  /** Hash of a trail entry as stored. */
  entryHash(sequence: number): string | undefined;
}

/** Checks every signature in a project against its key, its finding, the cited results, and the trail. */
export function checkSignatures(project: Project): SignatureCheck[] {
  const evidence: SignatureEvidence = {
    records: (kind) => project.list(kind),
    content: (contentDigest) => orUndefined(() => project.content(contentDigest)),
    entryHash: (sequence) => orUndefined(() => project.trailEntry(sequence).hash),
  };
  return project.list('signature').map((signature) => checkSignature(signature, evidence));
}

export function checkSignature(signature: Signature, evidence: SignatureEvidence): SignatureCheck {
  const reason = whyInvalid(signature, evidence);
  return {
    signatureId: signature.id,
    claimId: signature.claimId,
    revision: signature.revision,
    meaning: signature.meaning,
    signer: [signature.signer.name, signature.signer.role].filter(Boolean).join(', '),
    fingerprint: fingerprint(signature.publicKey),
    isValid: reason === null,
    reason,
  };
}

function whyInvalid(signature: Signature, evidence: SignatureEvidence): string | null {
  const payload = evidence.content(signature.payloadDigest);
  if (!payload) return 'the signed statement is missing or was altered';
  if (!verifyEd25519(signature.publicKey, payload, signature.signature)) {
    return 'the signature was not made over this statement with this key';
  }
  const statement = parseStatement(payload);
  if (!statement) return 'what was signed is not a statement that Footing makes';
  return (
    differsFromRecord(signature, statement) ??
    differsFromFinding(statement, evidence) ??
    differsFromClaim(statement, evidence) ??
    differsFromTrail(statement, evidence)
  );
}

function parseStatement(payload: Uint8Array): SignedStatement | null {
  try {
    const text = Buffer.from(payload).toString('utf8');
    const statement = signedStatement.parse(JSON.parse(text));
    return canonicalJson(statement) === text ? statement : null;
  } catch {
    return null;
  }
}

function differsFromRecord(signature: Signature, statement: SignedStatement): string | null {
  const { finding, trailHead, signer, meaning, remark, signedAt } = statement;
  const { publicKey, ...nameAndRole } = signer;
  const signed = {
    id: signature.id,
    claimId: finding.claimId,
    findingId: finding.id,
    revision: finding.revision,
    meaning,
    remark,
    signer: nameAndRole,
    signedAt,
    publicKey,
    trailSequence: trailHead.sequence,
    trailHash: trailHead.hash,
    payloadDigest: signature.payloadDigest,
    signature: signature.signature,
  } satisfies Signature;
  return difference('the signature’s own record', signed, signature);
}

function differsFromFinding({ finding, results }: SignedStatement, evidence: SignatureEvidence): string | null {
  const now = byId(evidence.records('finding'), finding.id);
  if (!now) return 'the finding is gone';
  const changed = difference('the finding', finding, now);
  if (changed) return changed;
  const resultsNow = evidence.records('result');
  for (const result of results) {
    const changedResult = difference(`result ${result.id}`, result, byId(resultsNow, result.id));
    if (changedResult) return changedResult;
    if (!evidence.content(result.answerDigest)) return `the answer of result ${result.id} is missing or was altered`;
  }
  return null;
}

/** The claim and its marks may move on once a newer revision of the finding is begun, not before. */
function differsFromClaim({ finding, claim, marks }: SignedStatement, evidence: SignatureEvidence): string | null {
  const isRevised = evidence
    .records('finding')
    .some((other) => other['claimId'] === claim.id && Number(other['revision']) > finding.revision);
  if (isRevised) return null;
  const marksNow = evidence.records('mark').filter((mark) => mark['claimId'] === claim.id);
  return (
    difference('the claim', claim, byId(evidence.records('claim'), claim.id)) ??
    difference('the marks on its assumptions', marks, marksNow)
  );
}

function differsFromTrail({ trailHead }: SignedStatement, evidence: SignatureEvidence): string | null {
  if (evidence.entryHash(trailHead.sequence) === trailHead.hash) return null;
  return `the trail no longer has the entry ${trailHead.sequence} that was its last when this was signed`;
}

function difference(what: string, signed: unknown, now: unknown): string | null {
  const found = firstDifference(signed, now);
  return found && `${what} changed since: ${found.path} was ${found.one} and is ${found.other}`;
}

function byId(records: Record<string, unknown>[], id: number): Record<string, unknown> | undefined {
  return records.find((record) => record['id'] === id);
}

function orUndefined<Value>(read: () => Value): Value | undefined {
  try {
    return read();
  } catch {
    return undefined;
  }
}
