import type { ClaimLine } from '../../src-main/contract/project.ts';
import { paddedDomain, type Domain } from '../../src-main/figures/axis.ts';

/** Shorter than this share of its largest number, an axis would make a difference in the third digit look like a gulf. */
const minShare = 0.25;

/** One axis per unit over everything that the claims in that unit state and recompute, so that miniatures can be compared by eye. */
export function claimDomains(claims: readonly ClaimLine[]): Map<string, Domain> {
  const marks = new Map<string, number[]>();
  for (const { unit, statedValue, recomputed } of claims) {
    const found = recomputed ? [recomputed.value, recomputed.low, recomputed.high] : [];
    marks.set(unit, [...(marks.get(unit) ?? []), statedValue, ...found.filter((mark) => mark !== null)]);
  }
  return new Map([...marks].map(([unit, values]) => [unit, readableDomain(values)]));
}

function readableDomain(values: readonly number[]): Domain {
  const { low, high } = paddedDomain(values, 0.08);
  const shortfall = minShare * Math.max(Math.abs(low), Math.abs(high)) - (high - low);
  return shortfall > 0 ? { low: low - shortfall / 2, high: high + shortfall / 2 } : { low, high };
}
