import { z } from 'zod';
import { shortText } from './primitives.ts';

const range = {
  best: z.number(),
  low: z.number(),
  high: z.number(),
  /** Probability of the central range: 90 for 5–95 %. */
  levelPercent: z.number().min(50).max(99.9),
};
const isOrdered = ({ best, low, high }: { best: number; low: number; high: number }) => low <= best && best <= high;
const order = { error: 'the best value lies within its range' };

/** A best value with its range, which need not be symmetric; both ends equal to it for an exact value. */
export const rangedValue = z.object(range).refine(isOrdered, order);

/** The same with where it comes from, as a reviewer supplies it. */
export const uncertainInput = z.object({ ...range, source: shortText }).refine(isOrdered, order);
export type UncertainInput = z.infer<typeof uncertainInput>;
