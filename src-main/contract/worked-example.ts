import { z } from 'zod';
import { claimDraft } from './claim.ts';
import { conclusion } from './finding.ts';
import { longText, shortText } from './primitives.ts';
import { source } from './project.ts';
import { assumptionId, markValue } from './result.ts';
import { readOptions, seriesChoice } from './series.ts';

/** A path inside the example's own folder. */
const insidePath = z.string().regex(/^(?!.*\.\.)[\w.-]+(\/[\w.-]+)*$/, 'a relative path inside the folder');

/** `claims.json` of a worked example: what a reviewer did, in an order in which it can be done again. */
export const workedExample = z.object({
  title: z.string().min(1).max(200),
  isInvented: z.literal(true),
  reviewer: z.object({ name: shortText, role: shortText }),
  /** What the invented data were made of, so that the finding can be judged. */
  truth: longText,
  sources: z.array(source.omit({ id: true, file: true }).extend({ path: insidePath.nullable() })),
  datasets: z.array(
    z.object({ path: insidePath, options: readOptions, choices: z.array(seriesChoice).min(1), licence: longText }),
  ),
  claims: z.array(
    z.object({
      claim: claimDraft,
      minYears: z.int().min(3).nullable(),
      marks: z.array(z.object({ assumptionId, mark: markValue, note: longText })),
      notes: z.array(longText),
      finding: z.object({ conclusion, text: longText, conditions: longText, publishedValueIds: z.array(z.string()) }),
    }),
  ),
});
export type WorkedExample = z.infer<typeof workedExample>;
