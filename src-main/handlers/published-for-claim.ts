import type { Claim } from '../contract/claim.ts';
import type { PublishedValue } from '../contract/finding.ts';
import type { QuantityId } from '../contract/primitives.ts';
import { publishedFor } from '../quantities/published-values.ts';

const sensitivities: QuantityId[] = [
  'apparent-sensitivity',
  'transient-climate-response',
  'effective-climate-sensitivity',
  'equilibrium-climate-sensitivity',
];

/** Published ranges that a claim may be held against: of the quantity it is presented as first, then of its own, then the rest. */
export function publishedForClaim({ statement: { quantity, presentedAs } }: Claim): PublishedValue[] {
  const quantities = sensitivities.includes(quantity) ? [presentedAs, quantity, ...sensitivities] : [quantity];
  return [...new Set(quantities)].flatMap((one) => (one === null ? [] : publishedFor(one)));
}
