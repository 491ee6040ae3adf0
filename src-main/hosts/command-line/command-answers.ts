import { z } from 'zod';
import { claim } from '../../contract/claim.ts';
import { estimatorComparison } from '../../contract/estimator-comparison.ts';
import { finding, mark, note, publishedValue, signature } from '../../contract/finding.ts';
import { recordId } from '../../contract/primitives.ts';
import { claimLine, projectView, source } from '../../contract/project.ts';
import { errorAnswer } from '../../contract/requests.ts';
import { assumptionsAnswer, claimSweep, derivationAnswer, recomputation, result } from '../../contract/result.ts';
import { importPreview, series } from '../../contract/series.ts';
import { recheckReport, trailLine, verifyReport } from '../../contract/trail.ts';

const recomputed = z.object({
  claimId: recordId,
  result: result.nullable(),
  recomputation: recomputation.nullable(),
  derivation: derivationAnswer.nullable(),
});
const imported = z.object({
  file: z.string(),
  datasetId: recordId,
  ...importPreview.pick({ reader: true, nRows: true, notes: true, alreadyImportedAs: true }).shape,
  leftOut: importPreview.shape.badRows,
  series: z.array(series),
});
const computed = z.union([
  z.object({ ok: z.literal(true), value: z.json() }),
  z.object({ ok: z.literal(false), error: errorAnswer.omit({ kind: true }) }),
]);
const helpLine = { name: z.string(), usage: z.string(), summary: z.string() };

/** What each command prints with --json when it has done its work, by the command's name. */
export const commandAnswers: Record<string, z.ZodType> = {
  new: projectView,
  demo: z.object({
    project: z.string(),
    report: z.array(z.string()),
    claims: z.array(claimLine),
    verify: verifyReport,
    recheck: recheckReport,
  }),
  verify: verifyReport,
  recheck: recheckReport,
  trail: z.array(trailLine),
  undo: projectView,
  redo: projectView,
  import: z.array(imported),
  series: z.array(series),
  source: z.array(source),
  claim,
  /** Of one claim, or of every one: those that could not be recomputed have the error in its place. */
  recompute: z.union([recomputed, z.array(z.union([recomputed, z.object({ claimId: recordId, error: errorAnswer })]))]),
  assumptions: assumptionsAnswer.nullable(),
  sweep: claimSweep.nullable(),
  estimators: estimatorComparison.nullable(),
  mark: z.array(mark),
  note,
  published: z.array(publishedValue),
  finding,
  sign: signature,
  revise: finding,
  report: z.array(z.string()),
  compute: z.union([computed, z.array(computed)]),
  /** The names without one; with one, a JSON Schema, whose form is that of json-schema.org. */
  schema: z.union([z.array(z.string()), z.record(z.string(), z.json())]),
  help: z.union([
    z.array(z.object(helpLine)),
    z.object({ ...helpLine, options: z.record(z.string(), z.string()), examples: z.array(z.string()) }),
  ]),
};

/** What every command prints with --json instead, when it could not do its work. */
export const commandRefusal = z.object({ ok: z.literal(false), error: errorAnswer });
