import type { ClaimComputation } from '../contract/compute.ts';
import type { Weight } from '../contract/result.ts';
import { statedHalfUnit, statedInterval, statedValue } from '../quantities/stated-number.ts';

type Weighed = Pick<ClaimComputation, 'statement' | 'tolerance'>;

/**
 * Weight of a shift against the reviewer's tolerance: notable from the notable share of the stated value on, decisive
 * from the decisive share on. A shift of less than half the last stated digit could not be seen in the number as
 * printed: it is negligible whatever its share.
 */
export function weighShift({ statement, tolerance }: Weighed, shift: number): Weight {
  const stated = Math.abs(statedValue(statement.value));
  const visible = statedHalfUnit(statement.value);
  const size = Math.abs(shift);
  if (size >= Math.max(tolerance.decisiveShare * stated, visible)) return 'decisive';
  if (size >= Math.max(tolerance.notableShare * stated, visible)) return 'notable';
  return 'negligible';
}

/** As {@link weighShift}; decisive too when the stated bound holds for one of the two numbers and not for the other. */
export function weighAlternative(claim: Weighed, recomputed: number, alternative: number): Weight {
  const isCrossed = isWithinBound(claim, recomputed) !== isWithinBound(claim, alternative);
  return isCrossed ? 'decisive' : weighShift(claim, alternative - recomputed);
}

/** Whether a number keeps to the stated bound, within its rounding: at most 1.9 holds below 1.95. */
export function isWithinBound({ statement }: Pick<Weighed, 'statement'>, value: number): boolean {
  const { low, high } = statedInterval(statement.value);
  if (statement.bound === 'at most') return value < high;
  if (statement.bound === 'at least') return value >= low;
  return true;
}

const order: readonly Weight[] = ['negligible', 'notable', 'decisive'];

export function heavier(a: Weight, b: Weight): Weight {
  return order.indexOf(a) >= order.indexOf(b) ? a : b;
}

/** How a sentence ends that has just said by how much a number moves. */
export const weightWords: Readonly<Record<Weight, string>> = {
  negligible: 'negligible against the tolerance of this review',
  notable: 'notable against the tolerance of this review',
  decisive: 'decisive against the tolerance of this review',
};
