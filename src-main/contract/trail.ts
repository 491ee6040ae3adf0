import { z } from 'zod';
import { recordId, sha256, shortText, timestamp } from './primitives.ts';
import { signatureCheck } from './finding.ts';

/** The kinds of record in a project; each is a table of the file. */
export const recordKind = z.enum([
  'project',
  'source',
  'dataset',
  'series',
  'claim',
  'result',
  'mark',
  'note',
  'finding',
  'signature',
]);
export type RecordKind = z.infer<typeof recordKind>;

export const recordChange = z.object({
  kind: recordKind,
  id: recordId,
  /** null: the record did not exist before, or does not exist after. */
  before: z.record(z.string(), z.json()).nullable(),
  after: z.record(z.string(), z.json()).nullable(),
});
export type RecordChange = z.infer<typeof recordChange>;

export const trailEntry = z.object({
  sequence: z.int().positive(),
  at: timestamp,
  reviewer: z.object({ name: shortText, role: shortText }),
  /** What was done, as a verb phrase: "import dataset", "mark assumption". */
  action: z.string(),
  /** What it was done to, in words: "claim 2 · zero-intercept". */
  subject: z.string(),
  engineVersion: z.string(),
  changes: z.array(recordChange),
  /** Digests of content (file bytes, series values, answers) that this entry brought in. */
  content: z.array(sha256),
  /** The entry that this one takes back; null otherwise. */
  undoes: z.int().positive().nullable(),
});
export type TrailEntry = z.infer<typeof trailEntry>;

/** A trail entry as screens list it: without the changed records. */
export const trailLine = trailEntry
  .omit({ changes: true, content: true })
  .extend({ hash: sha256, claimIds: z.array(recordId), isUndone: z.boolean(), canUndo: z.boolean() });
export type TrailLine = z.infer<typeof trailLine>;

export const trailHead = z.object({ sequence: z.int(), hash: sha256 });
export type TrailHead = z.infer<typeof trailHead>;

/** One thing that verification found wrong. */
export const verifyProblem = z.object({
  code: z.enum([
    'schema',
    'file-damaged',
    'entry-altered',
    'entry-missing',
    'entry-order',
    'head-mismatch',
    'record-altered',
    'record-missing',
    'record-without-entry',
    'content-altered',
    'content-missing',
    'content-without-entry',
    'signature-invalid',
  ]),
  where: z.string(),
  detail: z.string(),
});
export type VerifyProblem = z.infer<typeof verifyProblem>;

export const verifyReport = z.object({
  isSound: z.boolean(),
  problems: z.array(verifyProblem),
  nEntries: z.int(),
  nRecords: z.int(),
  nContents: z.int(),
  head: trailHead,
  signatures: z.array(signatureCheck),
});
export type VerifyReport = z.infer<typeof verifyReport>;

export const recheckDifference = z.object({
  resultId: recordId,
  claimId: recordId,
  method: z.string(),
  /** JSON path of the first differing value. */
  path: z.string(),
  stored: z.string(),
  recomputed: z.string(),
});
export const recheckReport = z.object({
  nResults: z.int(),
  isIdentical: z.boolean(),
  differences: z.array(recheckDifference),
  engineVersions: z.array(z.string()),
});
export type RecheckReport = z.infer<typeof recheckReport>;
