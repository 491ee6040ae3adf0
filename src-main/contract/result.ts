import { z } from 'zod';
import { caveat, interval, quantityId, recordId, sha256, timestamp, year, yearSpan } from './primitives.ts';
import { claimUnit } from './stated.ts';

const numbers = z.array(z.number());

/**
 * Answer of a least-squares fit; coefficients with the intercept first when there is one. null: does not exist, as for
 * an exact fit or a constant y; a caveat says why.
 */
export const regressionAnswer = z.object({
  coefficients: numbers,
  standardErrors: numbers,
  t: z.array(z.number().nullable()),
  p: z.array(z.number().nullable()),
  confidence95: z.array(z.tuple([z.number(), z.number()])),
  covarianceMatrix: z.array(numbers),
  rSquaredCentred: z.number().nullable(),
  rSquaredUncentred: z.number().nullable(),
  adjustedRSquared: z.number().nullable(),
  residualStandardDeviation: z.number(),
  degreesOfFreedom: z.int(),
  fStatistic: z.number().nullable(),
  fP: z.number().nullable(),
  logLikelihood: z.number().nullable(),
  aic: z.number().nullable(),
  bic: z.number().nullable(),
  durbinWatson: z.number().nullable(),
  residuals: numbers,
  fitted: numbers,
  leverage: numbers,
  cooksDistance: z.array(z.number().nullable()),
  /** Where the lag of Newey–West errors was chosen from the data. */
  chosenLag: z.int().optional(),
  caveats: z.array(caveat),
});
export type RegressionAnswer = z.infer<typeof regressionAnswer>;

/** Rows that two series share, year by year, after averaging and re-anchoring. */
export const alignedRows = z.object({
  years: z.array(year),
  co2Ppm: numbers,
  temperatureK: numbers,
  /** ln(C/C0). */
  logRatio: numbers,
  /** T − T0. */
  warmingK: numbers,
});
export type AlignedRows = z.infer<typeof alignedRows>;

export const leftOutYear = z.object({ year, reason: z.string() });

/** null: does not exist, as for an exact fit or a constant y. */
export const fitDiagnostics = z.object({
  nObs: z.int(),
  rSquaredCentred: z.number().nullable(),
  rSquaredUncentred: z.number().nullable(),
  correlation: z.number().nullable(),
  durbinWatson: z.number().nullable(),
  lag1Autocorrelation: z.number().nullable(),
  effectiveSampleSize: z.number().nullable(),
  residualStandardDeviation: z.number(),
});
export type FitDiagnostics = z.infer<typeof fitDiagnostics>;

const figureRows = z.object({
  columns: z.array(z.string()),
  rows: z.array(z.array(z.union([z.string(), z.number(), z.null()]))),
});

const workingTable = figureRows.extend({ caption: z.string() });
export type WorkingTable = z.infer<typeof workingTable>;

/** How the recomputed number relates to the stated one. */
export const agreement = z.object({
  /** The numbers that round to the stated digits: [low, high). */
  statedInterval: z.object({ low: z.number(), high: z.number() }),
  isReproduced: z.boolean(),
  /** Recomputed minus stated, in the claim's unit. */
  difference: z.number(),
  sentence: z.string(),
});
export type Agreement = z.infer<typeof agreement>;

export const slopeEstimate = z.object({
  value: z.number(),
  standardError: z.number(),
  interval95: interval,
  convention: z.string(),
});

export const recomputation = z.object({
  quantity: quantityId,
  unit: claimUnit,
  value: z.number(),
  standardError: z.number().nullable(),
  /** With its level: 95 % of a line, 5–95 % of draws. */
  interval: interval.nullable(),
  agreement,
  /** Regression procedures only. */
  fit: z
    .object({
      window: yearSpan,
      /** Slope in its own unit (K per e-folding; K per year) under each covariance, the procedure's own first. */
      slopes: z.array(slopeEstimate),
      intercept: z.object({ value: z.number(), standardError: z.number() }).nullable(),
      diagnostics: fitDiagnostics,
      regression: regressionAnswer,
      years: z.array(year),
      x: numbers,
      y: numbers,
      xLabel: z.string(),
      yLabel: z.string(),
      aligned: alignedRows.nullable(),
      leftOut: z.array(leftOutYear),
      anchorValues: z.object({ co2Ppm: z.number(), temperatureK: z.number(), years: yearSpan }).nullable(),
    })
    .nullable(),
  /** The conversion in words and figures: "2.71 K × ln 2 = 1.88 K per doubling". */
  conversion: z.string().nullable(),
  /** Inputs and figures on the way, of procedures without a line. */
  working: z.array(workingTable),
  caveats: z.array(caveat),
});
export type Recomputation = z.infer<typeof recomputation>;

export const assumptionId = z.enum([
  'zero-intercept',
  'anchor-year',
  'window',
  'independent-errors',
  'r-squared',
  'omitted-forcings',
  'transient-as-equilibrium',
  'like-for-like',
  'quoted-range',
]);
export type AssumptionId = z.infer<typeof assumptionId>;

/** What the catalogue says of an assumption. */
export const catalogueEntry = z.object({
  id: assumptionId,
  group: z.enum(['The line', 'The errors', 'What the slope stands for', 'The words and units']),
  /** What the number needs, as a sentence without its full stop. */
  title: z.string(),
  /** A few words, for figures and narrow columns. */
  shortTitle: z.string(),
  /** Why it matters, for a reader who is not a statistician. */
  explanation: z.string(),
  /** What the test does. */
  method: z.string(),
  /** In plain text; symbols: x = ln(C/C0), y = T − T0, b the slope of y on x, S = b ln 2. */
  formula: z.string(),
  /** Series and figures that the test needs. */
  needs: z.string(),
  /** Author year, equation or section. */
  source: z.string(),
});
export type CatalogueEntry = z.infer<typeof catalogueEntry>;

export const weight = z.enum(['negligible', 'notable', 'decisive']);
export type Weight = z.infer<typeof weight>;
export const markValue = z.enum(['met', 'not met', 'untested']);
export type MarkValue = z.infer<typeof markValue>;

/** What a test of one assumption returns. */
export const assumptionOutcome = z.object({
  id: assumptionId,
  isTestable: z.boolean(),
  /** Why it cannot be tested, and what would make it testable. */
  missing: z.object({ reason: z.string(), wouldNeed: z.string() }).nullable(),
  statistic: z
    .object({
      /** "intercept t", "Durbin–Watson". */
      label: z.string(),
      value: z.number(),
      p: z.number().nullable(),
      interval: interval.nullable(),
      /** Covariance, lag, degrees of freedom: everything a reader needs to get the same number. */
      convention: z.string(),
    })
    .nullable(),
  /** One line for the ledger's Test column. */
  test: z.string(),
  /** The number under the changed assumption. Its quantity may differ from the claim's: say which. */
  alternative: z
    .object({
      value: z.number(),
      interval: interval.nullable(),
      quantity: quantityId,
      unit: claimUnit,
      label: z.string(),
    })
    .nullable(),
  /** Alternative minus recomputed, in the claim's unit; null when there is no alternative of a comparable unit. */
  effect: z.number().nullable(),
  weight: weight.nullable(),
  reading: z.string(),
  proposal: z.object({ mark: markValue, reason: z.string() }),
  /** Sentence for the report, in plain language, figures filled in. */
  sentence: z.string(),
  /** Supporting figures: a small table shown on demand. */
  table: figureRows.nullable(),
  caveats: z.array(caveat),
});
export type AssumptionOutcome = z.infer<typeof assumptionOutcome>;

export const ladderRung = z.object({
  assumptionId,
  label: z.string(),
  value: z.number(),
  interval90: interval,
  quantity: quantityId,
  /** Value minus that of the rung before. */
  step: z.number(),
});
export const ladder = z.object({
  start: z.object({ value: z.number(), interval90: interval, quantity: quantityId }),
  rungs: z.array(ladderRung),
  /** Assumptions that could not become a rung, with the reason. */
  notApplied: z.array(z.object({ assumptionId, reason: z.string() })),
  unit: claimUnit,
  random: z.object({ generator: z.string(), seed: z.int(), nDraws: z.int() }),
  caveats: z.array(caveat),
});
export type Ladder = z.infer<typeof ladder>;

export const assumptionsAnswer = z.object({ outcomes: z.array(assumptionOutcome), ladder: ladder.nullable() });
export type AssumptionsAnswer = z.infer<typeof assumptionsAnswer>;

export const sweepWindow = z.object({
  start: year,
  end: year,
  n: z.int(),
  slope: z.number(),
  standardError: z.number(),
});
const quantiles = z.object({ min: z.number(), q05: z.number(), q50: z.number(), q95: z.number(), max: z.number() });
export const windowSweep = z.object({
  windows: z.array(sweepWindow),
  /** Of the slopes over all windows. */
  quantiles,
  caveats: z.array(caveat),
});
export type WindowSweep = z.infer<typeof windowSweep>;

export const claimSweep = windowSweep.extend({
  /** Turns a slope into the claim's number: value = slope × factor. */
  factor: z.number(),
  unit: claimUnit,
  minYears: z.int(),
  stated: z.object({ window: yearSpan, value: z.number(), percentile: z.number() }),
  /** Of the numbers (slope × factor). */
  valueQuantiles: quantiles,
  shareAtOrBelowStated: z.number(),
});
export type ClaimSweep = z.infer<typeof claimSweep>;

const closedInterval = z.object({ low: z.number(), high: z.number() });
export const derivationLine = z.object({
  line: z.string(),
  /** Value with the inputs taken at their printed digits. */
  value: z.number().nullable(),
  /** As printed beside the stated number; units are kept, not computed with. */
  unit: z.string().nullable(),
  stated: z.string().nullable(),
  statedInterval: closedInterval.nullable(),
  /** From the rounding intervals of the inputs. */
  computedInterval: closedInterval.nullable(),
  agrees: z.boolean().nullable(),
  likelySlip: z.string().nullable(),
  /** How the line was read where it can be read in two ways; agreement to a single digit. */
  remark: z.string().nullable(),
  /** What cannot be read in this line, where, and what was expected. */
  problem: z.string().nullable(),
});
export const derivationAnswer = z.object({ lines: z.array(derivationLine) });
export type DerivationAnswer = z.infer<typeof derivationAnswer>;

export const resultMethod = z.enum(['recomputation', 'assumptions', 'claim-sweep', 'estimators', 'derivation']);
export type ResultMethod = z.infer<typeof resultMethod>;

/** A stored computation: everything needed to run it again, and the digest of what came out. */
export const result = z.object({
  id: recordId,
  claimId: recordId,
  method: resultMethod,
  /** The request as plain JSON, with series by digest. */
  request: z.record(z.string(), z.json()),
  requestDigest: sha256,
  answerDigest: sha256,
  seed: z.int().nullable(),
  engineVersion: z.string(),
  computedAt: timestamp,
});
export type Result = z.infer<typeof result>;
