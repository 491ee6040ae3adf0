import type { PublishedValue } from '../contract/finding.ts';
import type { PublishedQuantityId } from '../contract/primitives.ts';
import { ar6Sensitivities } from './published-values/ar6-sensitivities.ts';
import { budgetSensitivities } from './published-values/budget-sensitivities.ts';
import { doublingForcings } from './published-values/doubling-forcings.ts';
import { earlierSensitivities } from './published-values/earlier-sensitivities.ts';
import { energyInventory } from './published-values/energy-inventory.ts';
import { feedbacks } from './published-values/feedbacks.ts';
import { forcingByAgent } from './published-values/forcing-by-agent.ts';
import { observedWarming } from './published-values/observed-warming.ts';

/**
 * Published values that a claim can be held against, each for its own quantity, with edition, place, and how the value
 * came into this table: `seen` in the publication, `second-hand` from a text that cites it, `memory`, to be looked up
 * before it decides anything. The first value of a quantity is its current assessment.
 */
export const publishedValues: readonly PublishedValue[] = [
  ...ar6Sensitivities,
  ...budgetSensitivities,
  ...earlierSensitivities,
  ...feedbacks,
  ...doublingForcings,
  ...forcingByAgent,
  ...energyInventory,
  ...observedWarming,
];

/** The published values of one quantity; none for a quantity that no publication assesses. */
export function publishedFor(quantity: PublishedQuantityId): PublishedValue[] {
  return publishedValues.filter((value) => value.quantity === quantity);
}
