import { z } from 'zod';

export const bound = z.enum(['equals', 'at most', 'at least']);
export type Bound = z.infer<typeof bound>;

/** A number as printed: the digits decide how far it may be off by rounding. */
export const statedNumber = z
  .string()
  .regex(/^[+\-−]?(\d+([.,]\d*)?|[.,]\d+)([eE][+-]?\d+)?$/, 'a plain decimal number, as printed');

export const claimUnit = z.enum([
  'K per doubling',
  'K per e-folding',
  '°F per doubling',
  'K per decade',
  'K per year',
  'W/m²',
  'W/m² per K',
  'ppm',
  '%',
  '1',
]);
export type ClaimUnit = z.infer<typeof claimUnit>;
