import type { ClaimLine } from '../../src-main/contract/project.ts';
import { paddedDomain, type Domain } from '../../src-main/figures/axis.ts';

/** One axis per unit over everything that the claims in that unit state and recompute, so that miniatures can be compared by eye. */
export function claimDomains(claims: readonly ClaimLine[]): Map<string, Domain> {
  const marks = new Map<string, number[]>();
  for (const { unit, statedValue, recomputed } of claims) {
    const found = [statedValue, recomputed?.value, recomputed?.low, recomputed?.high].filter((mark) => mark != null);
    marks.set(unit, [...(marks.get(unit) ?? []), ...found]);
  }
  return new Map([...marks].map(([unit, values]) => [unit, paddedDomain(values, 0.08)]));
}
