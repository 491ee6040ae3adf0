import type { ValuesRequirement } from './finite-values.ts';
import { mean } from './summation.ts';
import { varyingValues } from './varying-values.ts';

/**
 * Deviations from the mean, for whatever divides by their spread: refuses a constant, which has none.
 *
 * @throws   InputError wrong-length, too-few-values, not-finite; NumericError constant
 */
export function deviations(
  caller: string,
  name: string,
  values: ArrayLike<number>,
  requirement: ValuesRequirement,
): Float64Array {
  const checked = varyingValues(caller, name, values, requirement);
  const average = mean(checked);
  return checked.map((value) => value - average);
}
