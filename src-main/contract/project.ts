import { z } from 'zod';
import {
  agreement,
  catalogueEntry,
  assumptionOutcome,
  assumptionsAnswer,
  claimSweep,
  derivationAnswer,
  recomputation,
  result,
} from './result.ts';
import { claim, energyBudgetInputs, statementQuestion } from './claim.ts';
import { conclusion, finding, mark, note, publishedValue, reviewer, signature, signatureCheck } from './finding.ts';
import { estimatorComparison } from './estimator-comparison.ts';
import { figure, stemFigure } from './figure.ts';
import { longText, recordId, sha256, shortText, timestamp } from './primitives.ts';
import { dataset, series } from './series.ts';
import { trailHead, trailLine } from './trail.ts';

export const projectRecord = z.object({
  id: z.literal(1),
  title: z.string().min(1).max(200),
  createdAt: timestamp,
  /** True for projects made of invented data; shown on every screen and in the report. */
  isInvented: z.boolean(),
});
export type ProjectRecord = z.infer<typeof projectRecord>;

export const source = z.object({
  id: recordId,
  title: z.string().min(1).max(200),
  kind: z.enum(['talk', 'deck', 'paper', 'transcript', 'notes', 'figure', 'other']),
  /** Author, date, occasion: whatever is needed to find it again. */
  details: longText,
  /** The material as received, if it was attached. */
  file: z.object({ name: shortText, sizeBytes: z.int(), digest: sha256 }).nullable(),
});
export type Source = z.infer<typeof source>;

/** How far a section of the sheet has come. */
export const sectionState = z.enum(['untouched', 'in progress', 'done']);
export const sectionId = z.enum([
  'statement',
  'arithmetic',
  'data',
  'recomputation',
  'assumptions',
  'robustness',
  'finding',
]);
export type SectionId = z.infer<typeof sectionId>;

/** One row of the index: enough for its miniature. */
export const claimLine = z.object({
  id: recordId,
  title: z.string(),
  unit: z.string(),
  /** As printed, with its bound: "at most 1.9". */
  stated: z.string(),
  statedValue: z.number(),
  recomputed: z.object({ value: z.number(), low: z.number().nullable(), high: z.number().nullable() }).nullable(),
  /** "not begun", "in review", or the conclusion. */
  status: z.string(),
  isSigned: z.boolean(),
});
export type ClaimLine = z.infer<typeof claimLine>;

export const projectView = z.object({
  path: z.string(),
  project: projectRecord,
  isReadOnly: z.boolean(),
  sources: z.array(source),
  datasets: z.array(dataset),
  series: z.array(series),
  claims: z.array(claimLine),
  head: trailHead,
  undo: z.string().nullable(),
  redo: z.string().nullable(),
});
export type ProjectView = z.infer<typeof projectView>;

/** A stored answer with its record; stale when the claim, its series or its evidence have changed since. */
const stored = <Answer extends z.ZodType>(answer: Answer) => z.object({ result, answer, isStale: z.boolean() });

export const claimView = z.object({
  claim,
  sections: z.record(sectionId, sectionState),
  questions: z.array(statementQuestion),
  statedValue: z.number(),
  derivation: stored(derivationAnswer).nullable(),
  recomputation: stored(recomputation).nullable(),
  assumptions: stored(assumptionsAnswer).nullable(),
  sweep: stored(claimSweep).nullable(),
  estimators: stored(estimatorComparison).nullable(),
  /** What stands in the way of a recomputation: a series not chosen, a unit not set. */
  obstacles: z.array(z.string()),
  /** The series that the procedure works on. */
  procedureSeriesIds: z.array(recordId),
  marks: z.array(mark),
  notes: z.array(note),
  findings: z.array(finding),
  signatures: z.array(signature),
  signatureChecks: z.array(signatureCheck),
  stem: stemFigure.nullable(),
  figures: z.record(z.enum(['fit', 'residuals', 'lag', 'autocorrelation', 'quantiles', 'sweep']), figure.nullable()),
  /** What the assumptions in the ledger are called and how each is tested. */
  catalogue: z.array(catalogueEntry),
  /** Published ranges of quantities that this claim may be held against. */
  published: z.array(publishedValue),
  /** A published energy budget that the evidence can start from. */
  publishedBudget: energyBudgetInputs,
  /** Figures that a finding's text can name in braces, filled in. */
  fillIns: z.record(z.string(), z.string()),
  trail: z.array(trailLine),
  isFrozen: z.boolean(),
});
export type ClaimView = z.infer<typeof claimView>;

export const session = z.object({
  project: projectView.nullable(),
  reviewer: reviewer.nullable(),
  engineVersion: z.string(),
  host: z.enum(['electron', 'loopback', 'command line']),
  projectsDirectory: z.string(),
});
export type Session = z.infer<typeof session>;

/** The report as data: what HTML, PDF and JSON are made of. */
export const reportClaim = z.object({
  claim,
  source: source.nullable(),
  stem: stemFigure.nullable(),
  figures: z.array(figure),
  agreement: agreement.nullable(),
  recomputation: recomputation.nullable(),
  derivation: derivationAnswer.nullable(),
  ledger: z.array(z.object({ outcome: assumptionOutcome, title: z.string(), mark: mark.nullable() })),
  ladder: assumptionsAnswer.shape.ladder,
  sweep: claimSweep.nullable(),
  estimators: estimatorComparison.nullable(),
  conclusion: conclusion.nullable(),
  finding: finding.nullable(),
  findingText: z.string(),
  earlierFindings: z.array(finding),
  published: z.array(publishedValue),
  signatures: z.array(z.object({ signature, check: signatureCheck })),
  datasets: z.array(dataset),
  series: z.array(series),
  notes: z.array(note),
  results: z.array(result),
});
export type ReportClaim = z.infer<typeof reportClaim>;

export const report = z.object({
  title: z.string(),
  isInvented: z.boolean(),
  engineVersion: z.string(),
  writtenAt: timestamp,
  head: trailHead,
  claims: z.array(reportClaim),
  sources: z.array(source),
  cautions: z.array(z.string()),
});
export type Report = z.infer<typeof report>;
