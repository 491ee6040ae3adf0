import type { ClaimComputation } from '../contract/compute.ts';
import type { PublishedQuantityId, QuantityId } from '../contract/primitives.ts';
import type { Recomputation } from '../contract/result.ts';

/** The kind of number that the procedure gives: a ratio is what its statement says; a line is what a line can be. */
export function ownQuantity({ procedure, statement }: ClaimComputation, { quantity }: Recomputation): QuantityId {
  return procedure.kind === 'ratio' ? statement.quantity : quantity;
}

/** The kind of number that the statement says, or lets its readers believe, this is; null when it leaves that open. */
export function presentedQuantity(computation: ClaimComputation, recomputation: Recomputation): QuantityId | null {
  const { statement } = computation;
  if (statement.presentedAs) return statement.presentedAs;
  return statement.quantity === ownQuantity(computation, recomputation) ? null : statement.quantity;
}

/** Whether a kind of sensitivity speaks of a planet that has stopped taking up heat. */
export function isEquilibrium(quantity: PublishedQuantityId): boolean {
  return quantity === 'effective-climate-sensitivity' || quantity === 'equilibrium-climate-sensitivity';
}
