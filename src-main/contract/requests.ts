import { z } from 'zod';
import { claim, claimDraft, tolerance } from './claim.ts';
import { figure } from './figure.ts';
import { conclusion, reviewer, signatureMeaning } from './finding.ts';
import { longText, recordId, shortText, yearSpan } from './primitives.ts';
import { claimView, projectView, report, session, source } from './project.ts';
import { publishedLibrary } from './published.ts';
import type { RequestName } from './request-names.ts';
import { assumptionId, markValue } from './result.ts';
import { importPreview, readOptions, series, seriesChoice, seriesQuantity, seriesValues } from './series.ts';
import { recheckReport, trailEntry, trailLine, verifyReport } from './trail.ts';

const nothing = z.object({});
/** 64 MiB of file, as base64. */
const fileBytes = z.base64().max(90_000_000);
const fileName = z.string().min(1).max(255);
const path = z.string().min(1).max(4096);
const passphrase = z.string().min(8).max(1024);
const onClaim = z.object({ claimId: recordId });
const longWork = onClaim.extend({
  /** Chosen by the caller, so that it can follow and cancel the work. */
  jobId: z.string().max(64).optional(),
});

/** The contract: every request with its checked input and its answer. */
export const requests = {
  'session.get': { input: nothing, answer: session },
  'reviewer.set': {
    input: z.object({ name: z.string().trim().min(1).max(120), role: z.string().trim().max(120) }),
    answer: reviewer,
  },
  'identity.create': { input: z.object({ passphrase }), answer: reviewer },

  'projects.list': {
    input: z.object({ directory: path.optional() }),
    answer: z.object({
      directory: z.string(),
      parent: z.string().nullable(),
      folders: z.array(z.string()),
      projects: z.array(
        z.object({ path: z.string(), fileName: z.string(), title: z.string().nullable(), modifiedAt: z.string() }),
      ),
    }),
  },
  'project.create': {
    input: z.object({ title: z.string().trim().min(1).max(200), directory: path.optional(), path: path.optional() }),
    answer: projectView,
  },
  'project.open': { input: z.object({ path, readOnly: z.boolean().optional() }), answer: projectView },
  'project.openDemo': { input: z.object({ directory: path.optional() }), answer: projectView },
  'project.close': { input: nothing, answer: nothing },
  'project.view': { input: nothing, answer: projectView },
  'project.rename': { input: z.object({ title: z.string().trim().min(1).max(200) }), answer: projectView },
  'project.verify': { input: z.object({ path: path.optional() }), answer: verifyReport },
  'project.recheck': { input: z.object({ jobId: z.string().max(64).optional() }), answer: recheckReport },

  'source.save': {
    input: source.omit({ id: true, file: true }).extend({
      id: recordId.optional(),
      file: z.object({ name: fileName, bytes: fileBytes }).nullable().optional(),
    }),
    answer: projectView,
  },
  'source.remove': { input: z.object({ sourceId: recordId }), answer: projectView },

  'data.preview': { input: z.object({ fileName, bytes: fileBytes, options: readOptions }), answer: importPreview },
  'data.import': {
    input: z.object({
      fileName,
      bytes: fileBytes,
      options: readOptions,
      /** Series to take, by key. */
      choices: z.array(seriesChoice).min(1),
      /** Must be true when the preview lists bad rows: the reviewer has seen them and leaves them out. */
      leaveOutBadRows: z.boolean(),
      licence: longText.optional(),
    }),
    answer: z.object({ project: projectView, datasetId: recordId, seriesIds: z.array(recordId) }),
  },
  'dataset.remove': { input: z.object({ datasetId: recordId }), answer: projectView },
  'series.get': { input: z.object({ seriesId: recordId }), answer: z.object({ series, values: seriesValues, figure }) },
  'series.update': {
    input: z.object({
      seriesId: recordId,
      name: z.string().min(1).max(120).optional(),
      label: shortText.optional(),
      quantity: seriesQuantity.optional(),
      agent: z.string().nullable().optional(),
      unit: z.string().max(40).optional(),
      baseline: yearSpan.nullable().optional(),
    }),
    answer: projectView,
  },

  /** A further series: the same record, counted from another baseline period. The one it comes from stays as it is. */
  'series.rebase': {
    input: z.object({ seriesId: recordId, baseline: yearSpan, minMonths: z.int().min(1).max(12) }),
    answer: z.object({ project: projectView, seriesId: recordId, offset: z.number() }),
  },

  'claim.create': { input: claimDraft, answer: claimView },
  'claim.update': {
    input: onClaim.extend({
      change: claim.omit({ id: true }).partial().extend({ tolerance: tolerance.optional() }),
    }),
    answer: claimView,
  },
  'claim.remove': { input: onClaim, answer: projectView },
  'claim.view': { input: onClaim, answer: claimView },
  'claim.derive': { input: longWork, answer: claimView },
  'claim.recompute': { input: longWork, answer: claimView },
  'claim.testAssumptions': { input: longWork, answer: claimView },
  'claim.sweep': { input: longWork.extend({ minYears: z.int().min(3).max(1000) }), answer: claimView },
  'claim.compareEstimators': { input: longWork, answer: claimView },
  'claim.mark': { input: onClaim.extend({ assumptionId, mark: markValue, note: longText }), answer: claimView },

  'note.add': { input: onClaim.extend({ text: z.string().trim().min(1).max(20_000) }), answer: claimView },
  'note.remove': { input: onClaim.extend({ noteId: recordId }), answer: claimView },

  'finding.save': {
    input: onClaim.extend({
      conclusion: conclusion.nullable(),
      text: longText,
      conditions: longText,
      publishedValueIds: z.array(z.string()),
    }),
    answer: claimView,
  },
  'finding.sign': {
    input: onClaim.extend({ passphrase: z.string().max(1024), meaning: signatureMeaning, remark: longText }),
    answer: claimView,
  },
  'finding.revise': { input: onClaim.extend({ reason: z.string().trim().min(1).max(20_000) }), answer: claimView },

  /** Needs no project. */
  'published.list': { input: nothing, answer: publishedLibrary },

  'trail.list': {
    input: z.object({
      claimId: recordId.optional(),
      before: z.int().positive().optional(),
      limit: z.int().min(1).max(500),
    }),
    answer: z.object({ lines: z.array(trailLine), hasMore: z.boolean() }),
  },
  'trail.entry': {
    input: z.object({ sequence: z.int().positive() }),
    answer: z.object({ entry: trailEntry, previousHash: z.string(), hash: z.string() }),
  },
  'trail.undo': { input: nothing, answer: projectView },
  'trail.redo': { input: nothing, answer: projectView },

  'report.render': {
    input: z.object({ claimIds: z.array(recordId).optional() }),
    answer: z.object({ html: z.string(), report }),
  },
  'report.write': {
    input: z.object({
      directory: path,
      formats: z.array(z.enum(['html', 'json'])).min(1),
      claimIds: z.array(recordId).optional(),
    }),
    answer: z.object({ files: z.array(z.string()) }),
  },
  'figure.export': {
    input: z.object({ figure, format: z.enum(['svg', 'png', 'csv']) }),
    answer: z.object({ fileName: z.string(), mediaType: z.string(), bytes: z.base64() }),
  },

  'job.cancel': { input: z.object({ jobId: z.string().max(64) }), answer: z.object({ wasRunning: z.boolean() }) },
  compute: {
    input: z.object({ method: z.string() }).loose(),
    answer: z.json(),
  },
} as const satisfies Record<RequestName, { input: z.ZodType; answer: z.ZodType }>;

export type Requests = typeof requests;
export type RequestInput<Name extends RequestName> = z.infer<Requests[Name]['input']>;
export type RequestAnswer<Name extends RequestName> = z.infer<Requests[Name]['answer']>;

/** An error as it crosses the bridge. */
export const errorAnswer = z.object({
  kind: z.enum(['InputError', 'NumericError', 'ProjectError', 'Cancelled']),
  code: z.string(),
  where: z.string(),
  expected: z.string(),
  received: z.string(),
  hint: z.string(),
});
export type ErrorAnswer = z.infer<typeof errorAnswer>;

/** What every request answers: a value, or an error as data. */
export type Answer<Name extends RequestName> =
  { ok: true; value: RequestAnswer<Name> } | { ok: false; error: ErrorAnswer };
