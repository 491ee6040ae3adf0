import { z } from 'zod';
import { likelihoodTerm, publishedValue } from './finding.ts';
import { publishedQuantityId } from './primitives.ts';

const provenance = publishedValue.shape.provenance;

/** A publication that says two things of one number. */
export const publishedConflict = z.object({
  id: z.string(),
  title: z.string(),
  /** The published values that it touches. */
  valueIds: z.array(z.string()).min(1),
  readings: z.array(z.object({ words: z.string(), source: z.string(), value: z.number(), unit: z.string() })).min(2),
  reason: z.string(),
  /** Which reading Footing follows, and where. */
  taken: z.string(),
});
export type PublishedConflict = z.infer<typeof publishedConflict>;

/** What an edition means by a quantity, in other words than its own. */
export const publishedDefinition = z.object({
  quantity: publishedQuantityId,
  edition: z.string(),
  text: z.string(),
  source: z.string(),
  provenance,
});
export type PublishedDefinition = z.infer<typeof publishedDefinition>;

/** What a likelihood word says about probability, in per cent. */
export const likelihoodMeaning = z.object({ term: likelihoodTerm, lowPercent: z.number(), highPercent: z.number() });
export type LikelihoodMeaning = z.infer<typeof likelihoodMeaning>;

const studyInput = z.object({
  best: z.number(),
  /** Null where the study's range is not on record here. */
  range: z.object({ low: z.number(), high: z.number(), levelPercent: z.number() }).nullable(),
});

/** An energy-budget study: what went in, and the published values that came out. */
export const energyBudgetStudy = z.object({
  id: z.string(),
  label: z.string(),
  periods: z.string(),
  warmingK: studyInput,
  forcingWm2: studyInput,
  uptakeWm2: studyInput,
  doublingWm2: studyInput,
  /** Published values of its effective sensitivity and TCR; null where it gives none. */
  effcsId: z.string().nullable(),
  tcrId: z.string().nullable(),
  /** Of the inputs; the values carry their own. */
  provenance,
  remark: z.string().nullable(),
});
export type EnergyBudgetStudy = z.infer<typeof energyBudgetStudy>;

/** All that Footing knows of what has been published. */
export const publishedLibrary = z.object({
  values: z.array(publishedValue),
  conflicts: z.array(publishedConflict),
  definitions: z.array(publishedDefinition),
  likelihoods: z.array(likelihoodMeaning),
  studies: z.array(energyBudgetStudy),
});
export type PublishedLibrary = z.infer<typeof publishedLibrary>;
