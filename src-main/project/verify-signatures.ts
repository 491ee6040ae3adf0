import { type SignatureCheck, signature as signatureSchema } from '../contract/finding.ts';
import type { RecordKind, VerifyProblem } from '../contract/trail.ts';
import { checkSignature, type SignatureEvidence } from './check-signatures.ts';
import { digest } from './digest.ts';
import type { RawTables } from './raw-tables.ts';

/** Checks the signatures of a file that may have been altered. */
export function verifySignatures(tables: RawTables): { problems: VerifyProblem[]; checks: SignatureCheck[] } {
  const evidence = evidenceIn(tables);
  const problems: VerifyProblem[] = [];
  const checks: SignatureCheck[] = [];
  for (const record of evidence.records('signature')) {
    const { data: signature } = signatureSchema.safeParse(record);
    if (!signature) {
      problems.push(invalid(`signature ${String(record['id'])}`, 'it is not a signature as Footing writes it'));
      continue;
    }
    const check = checkSignature(signature, evidence);
    checks.push(check);
    if (check.reason !== null) problems.push(invalid(`signature ${signature.id}`, check.reason));
  }
  for (const { id, isSigned } of evidence.records('finding')) {
    const hasSignature = evidence
      .records('signature')
      .some(({ findingId, meaning }) => findingId === id && meaning === 'sign-off');
    if (isSigned === true && !hasSignature)
      problems.push(invalid(`finding ${String(id)}`, 'it is marked as signed, but nobody signed it'));
  }
  return { problems, checks };
}

function evidenceIn({ records, contentBytes, trail }: RawTables): SignatureEvidence {
  const parsed = new Map<RecordKind, Record<string, unknown>[]>();
  for (const [kind, rows] of records) {
    parsed.set(
      kind,
      (rows ?? []).map(({ body }) => parseObject(body)).filter((record) => record !== undefined),
    );
  }
  const hashes = new Map((trail ?? []).map(({ sequence, hash }) => [sequence, hash]));
  return {
    records: (kind) => parsed.get(kind) ?? [],
    content(contentDigest) {
      const bytes = contentBytes(contentDigest);
      return bytes && digest(bytes) === contentDigest ? bytes : undefined;
    },
    entryHash: (sequence) => hashes.get(sequence),
  };
}

function parseObject(body: string): Record<string, unknown> | undefined {
  try {
    const value: unknown = JSON.parse(body);
    return typeof value === 'object' && value !== null ? (value as Record<string, unknown>) : undefined;
  } catch {
    return undefined;
  }
}

function invalid(where: string, detail: string): VerifyProblem {
  return { code: 'signature-invalid', where, detail };
}
