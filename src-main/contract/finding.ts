import { z } from 'zod';
import { interval, longText, publishedQuantityId, recordId, sha256, shortText, timestamp } from './primitives.ts';
import { assumptionId, markValue } from './result.ts';

export const mark = z.object({
  id: recordId,
  claimId: recordId,
  assumptionId,
  mark: markValue,
  note: longText,
});
export type Mark = z.infer<typeof mark>;

/** A note in the margin of a claim. */
export const note = z.object({
  id: recordId,
  claimId: recordId,
  text: longText,
  author: shortText,
  writtenAt: timestamp,
});
export type Note = z.infer<typeof note>;

export const conclusion = z.enum([
  'supported',
  'supported on stated conditions',
  'not supported',
  'cannot be determined',
]);
export type Conclusion = z.infer<typeof conclusion>;

/** Words of the IPCC's calibrated language. */
export const likelihoodTerm = z.enum([
  'virtually certain',
  'extremely likely',
  'very likely',
  'likely',
  'more likely than not',
  'about as likely as not',
  'unlikely',
  'very unlikely',
  'extremely unlikely',
  'exceptionally unlikely',
]);
export type LikelihoodTerm = z.infer<typeof likelihoodTerm>;

export const publishedValue = z.object({
  id: z.string(),
  quantity: publishedQuantityId,
  /** What it is the quantity of, where the quantity alone does not say: an agent, a place, a period; else empty. */
  subject: z.string(),
  label: z.string(),
  best: z.number().nullable(),
  /** From narrow to wide. A level of null: the publication gives none. */
  ranges: z.array(
    z.object({
      interval: interval.extend({ levelPercent: interval.shape.levelPercent.nullable() }),
      words: z.string(),
    }),
  ),
  /** One-sided statements: very unlikely above 6. */
  limits: z.array(z.object({ term: likelihoodTerm, side: z.enum(['above', 'below']), value: z.number() })),
  unit: z.string(),
  edition: z.string(),
  source: z.string(),
  /** How the value was obtained for this table. */
  provenance: z.enum(['seen', 'second-hand', 'memory']),
  remark: z.string().nullable(),
});
export type PublishedValue = z.infer<typeof publishedValue>;

export const finding = z.object({
  id: recordId,
  claimId: recordId,
  revision: z.int().positive(),
  conclusion: conclusion.nullable(),
  /** The reviewer's words. Figures in braces, {recomputed}, are filled in from the cited results. */
  text: longText,
  /** Conditions, when the conclusion is "supported on stated conditions". */
  conditions: longText,
  publishedValueIds: z.array(z.string()),
  resultIds: z.array(recordId),
  /** What changed against the revision before, and why. Empty for the first. */
  reason: longText,
  isSigned: z.boolean(),
});
export type Finding = z.infer<typeof finding>;

export const signatureMeaning = z.enum(['sign-off', 'counter-signature', 'dissent']);
export type SignatureMeaning = z.infer<typeof signatureMeaning>;

export const signature = z.object({
  id: recordId,
  claimId: recordId,
  findingId: recordId,
  revision: z.int().positive(),
  meaning: signatureMeaning,
  remark: longText,
  signer: z.object({ name: shortText, role: shortText }),
  signedAt: timestamp,
  /** Raw Ed25519 public key, hexadecimal. */
  publicKey: z.string().regex(/^[0-9a-f]{64}$/),
  /** The trail head that this signature witnesses. */
  trailSequence: z.int(),
  trailHash: sha256,
  /** SHA-256 of the canonical JSON that was signed: finding, cited results, trail head, signer, meaning, time. */
  payloadDigest: sha256,
  signature: z.string().regex(/^[0-9a-f]{128}$/),
});
export type Signature = z.infer<typeof signature>;

export const signatureCheck = z.object({
  signatureId: recordId,
  claimId: recordId,
  revision: z.int(),
  meaning: signatureMeaning,
  signer: z.string(),
  fingerprint: z.string(),
  isValid: z.boolean(),
  /** Why it is not valid; null when it is. */
  reason: z.string().nullable(),
});
export type SignatureCheck = z.infer<typeof signatureCheck>;

export const reviewer = z.object({
  name: z.string().min(1).max(120),
  role: z.string().max(120),
  /** null until the first signature is needed. */
  publicKey: z.string().nullable(),
  fingerprint: z.string().nullable(),
});
export type Reviewer = z.infer<typeof reviewer>;
