import { z } from 'zod';
import { interval, longText, quantityId, recordId, shortText } from './primitives.ts';
import { procedure, procedureDraft, seriesReference } from './procedure.ts';
import { bound, claimUnit, statedNumber } from './stated.ts';
import { uncertainInput } from './uncertain-input.ts';

export const statement = z.object({
  /** The words of the source. */
  words: longText,
  sourceId: recordId.nullable(),
  /** Where in the source: slide 14; 12:27; page 3, line 8. */
  locator: shortText,
  quantity: quantityId,
  value: statedNumber,
  unit: claimUnit,
  bound,
  /** The definition as the source states it, or what the reviewer takes it to be, in words. */
  definition: longText,
  /** The kind of sensitivity that the source says, or lets its readers believe, the number is. */
  presentedAs: quantityId.nullable(),
  /** Goodness of fit stated beside the number, if any, as printed ("0.88", "88 %"). */
  statedRSquared: shortText.nullable(),
});
export type Statement = z.infer<typeof statement>;

/** A question that a careful colleague would ask about a statement, and the reviewer's answer. */
export const statementQuestion = z.object({
  id: z.string(),
  question: z.string(),
  why: z.string(),
  options: z.array(z.string()),
  answer: z.string().nullable(),
});
export type StatementQuestion = z.infer<typeof statementQuestion>;

/** Warming, forcing change, heat-uptake change between two periods, and the forcing of a CO2 doubling. */
export const energyBudgetInputs = z.object({
  warmingK: uncertainInput,
  forcingWm2: uncertainInput,
  uptakeWm2: uncertainInput,
  doublingWm2: uncertainInput,
});
export type EnergyBudgetInputs = z.infer<typeof energyBudgetInputs>;

/** A published range as the source quotes it, in the unit of the published value. */
export const quotedRange = z.object({
  /** The digits as printed; null: the source gives no such end. */
  low: statedNumber.nullable(),
  high: statedNumber.nullable(),
  /** How much of the probability the source says lies within; null: it does not say. */
  levelPercent: interval.shape.levelPercent.nullable(),
});
export type QuotedRange = z.infer<typeof quotedRange>;

/** What the reviewer supplies so that assumptions can be tested. */
export const evidence = z.object({
  /** Total effective radiative forcing, for omitted forcings. */
  totalForcingSeriesId: recordId.nullable(),
  co2ForcingSeriesId: recordId.nullable(),
  energyBudget: energyBudgetInputs.nullable(),
  /** Published value (its id) of the range the number is held against in the source; null: none named. */
  comparedWith: z.string().nullable(),
  /** The range that the source quotes for it; null: none. */
  quotedRange: quotedRange.nullable(),
  /** Forcing per CO2 doubling used to turn a forcing slope into K per doubling. */
  doublingWm2: uncertainInput.nullable(),
});
export type Evidence = z.infer<typeof evidence>;

/** When a shift counts: shares of the stated value. */
export const tolerance = z.object({
  notableShare: z.number().min(0).max(1),
  decisiveShare: z.number().min(0).max(1),
});
export type Tolerance = z.infer<typeof tolerance>;

export const claim = z.object({
  id: recordId,
  title: z.string().min(1).max(200),
  statement,
  /** Answers to the statement's questions, by question id. */
  answers: z.record(z.string(), z.string()),
  /** The arithmetic shown in the source, a line each: "2.71 * ln(2) = 1.9". */
  derivation: z.array(shortText).max(100),
  procedure: procedure.nullable(),
  evidence,
  tolerance,
  /** Random numbers of this claim's computations start from here. */
  seed: z.int().min(0).max(4_294_967_295),
});
export type Claim = z.infer<typeof claim>;

/** A claim as written by a person or a script: series may be named instead of numbered; the rest has defaults. */
export const claimDraft = z.object({
  title: z.string().min(1).max(200),
  statement: statement.partial().required({ words: true, quantity: true, value: true, unit: true }),
  answers: claim.shape.answers.optional(),
  derivation: claim.shape.derivation.optional(),
  procedure: procedureDraft.nullable().optional(),
  evidence: evidence
    .extend({
      totalForcingSeriesId: seriesReference.nullable(),
      co2ForcingSeriesId: seriesReference.nullable(),
    })
    .partial()
    .optional(),
  tolerance: tolerance.optional(),
  seed: claim.shape.seed.optional(),
});
export type ClaimDraft = z.infer<typeof claimDraft>;
