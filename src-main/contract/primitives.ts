import { z } from 'zod';

// The content security policy forbids eval; without this zod probes for it once and logs an error.
z.config({ jitless: true });

/** A row's identity within its kind. Shown to people as its number: claim 2, series 5. */
export const recordId = z.int().positive();
export const sha256 = z.string().regex(/^[0-9a-f]{64}$/, 'a SHA-256 digest: 64 lower-case hexadecimal digits');
export const year = z.int().min(-10_000).max(10_000);
/** UTC, to the millisecond. */
export const timestamp = z.iso.datetime({ precision: 3 });
export const shortText = z.string().max(500);
export const longText = z.string().max(20_000);

/** Doubt that is not failure: shown beside the number it touches. */
export const caveat = z.object({ code: z.string(), detail: z.string() });
export type Caveat = z.infer<typeof caveat>;

/** A range with its level. `null` at an end means that this end is unbounded. */
export const interval = z.object({
  low: z.number().nullable(),
  high: z.number().nullable(),
  levelPercent: z.number().positive().max(100),
});
export type Interval = z.infer<typeof interval>;

export const yearSpan = z.object({ start: year, end: year });
export type YearSpan = z.infer<typeof yearSpan>;

/** Kinds of number that a claim can state. Only numbers of one kind may be held against each other. */
export const quantityId = z.enum([
  'apparent-sensitivity',
  'effective-climate-sensitivity',
  'equilibrium-climate-sensitivity',
  'transient-climate-response',
  'trend',
  'effective-radiative-forcing',
  'radiative-forcing',
  'climate-feedback',
  'co2-change',
  'share',
  'ratio',
]);
export type QuantityId = z.infer<typeof quantityId>;

/** Kinds of number that publications state: those of claims, and those that claims are made of. */
export const publishedQuantityId = z.enum([
  ...quantityId.options,
  'feedback-parameter',
  'feedback-term',
  'pattern-effect',
  'ocean-uptake-damping',
  'effective-doubling-forcing',
  'adjusted-doubling-forcing',
  'tropospheric-adjustment',
  'energy-imbalance',
  'energy-inventory',
  'inventory-share',
  'warming',
  'attributed-warming',
]);
export type PublishedQuantityId = z.infer<typeof publishedQuantityId>;
