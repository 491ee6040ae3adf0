import type { UncertainInput } from '../contract/claim.ts';

/**
 * Standard deviation of a normal quantity from its 5–95 % half-width.
 *
 * Source   AR6 WG1 chapter 7 turns its ranges into standard deviations with the rounded factor 1.645
 */
export function standardDeviation({ halfWidth90 }: UncertainInput): number {
  return halfWidth90 / 1.645;
}
