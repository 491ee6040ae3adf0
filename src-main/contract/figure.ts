import { z } from 'zod';
import { interval, quantityId, sha256 } from './primitives.ts';
import { bound, claimUnit } from './stated.ts';

const figureFrame = {
  /** Short name, also the file name when saved. */
  name: z.string(),
  title: z.string(),
  /** One line: what the figure shows. */
  caption: z.string(),
  /** Digests of the series behind it. */
  digests: z.array(sha256),
};

/** The first figure of a sheet: one axis, the stated number, the recomputed one, a row per changed assumption. */
export const stemFigure = z.object({
  kind: z.literal('stem'),
  ...figureFrame,
  unit: claimUnit,
  stated: z.object({
    /** Label of its row, with the digits as printed: "Stated, at most 1.9". */
    text: z.string(),
    value: z.number(),
    bound,
    interval: z.object({ low: z.number(), high: z.number() }),
  }),
  recomputed: z.object({ value: z.number(), interval: interval.nullable() }).nullable(),
  rows: z.array(
    z.object({
      label: z.string(),
      value: z.number(),
      interval: interval.nullable(),
      quantity: quantityId,
      /** True when the row applies on top of the row above it (a rung of the ladder). */
      isCumulative: z.boolean(),
    }),
  ),
  bands: z.array(z.object({ label: z.string(), low: z.number(), high: z.number(), quantity: quantityId })),
});
export type StemFigure = z.infer<typeof stemFigure>;

const xyMark = z.object({
  label: z.string(),
  /** points: unconnected marks; line: connected; band: the area between y and y2. */
  mark: z.enum(['points', 'line', 'band']),
  x: z.array(z.number()),
  y: z.array(z.number().nullable()),
  y2: z.array(z.number().nullable()).nullable(),
  /** Drawn emphasis: data as received, what the source did, what changes, a reference line. */
  role: z.enum(['data', 'stated', 'alternative', 'reference']),
});

export const xyFigure = z.object({
  kind: z.literal('xy'),
  ...figureFrame,
  xLabel: z.string(),
  yLabel: z.string(),
  /** Years are set without thousands marks and never with decimals. */
  isXYears: z.boolean(),
  marks: z.array(xyMark),
});
export type XyFigure = z.infer<typeof xyFigure>;

export const figure = z.discriminatedUnion('kind', [stemFigure, xyFigure]);
export type Figure = z.infer<typeof figure>;
