import type { Claim } from '../contract/claim.ts';
import type { PublishedValue } from '../contract/finding.ts';
import { publishedFor, publishedValues } from '../quantities/published-values.ts';
import { sensitivities } from '../quantities/quantity-names.ts';

/**
 * Published values that a claim may be held against: of the quantity it is presented as first, then of its own, then the
 * rest; after them whatever else the finding quotes.
 */
export function publishedForClaim(
  { statement: { quantity, presentedAs } }: Claim,
  quotedIds: readonly string[] = [],
): PublishedValue[] {
  const quantities = sensitivities.includes(quantity) ? [presentedAs, quantity, ...sensitivities] : [quantity];
  const comparable = [...new Set(quantities)].flatMap((one) => (one === null ? [] : publishedFor(one)));
  const others = publishedValues.filter((value) => quotedIds.includes(value.id) && !comparable.includes(value));
  return [...comparable, ...others];
}
