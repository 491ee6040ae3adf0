import { NumericError } from '../errors.ts';
import { finiteValues } from './finite-values.ts';
import { mean } from './summation.ts';

/**
 * Deviations from the mean, for whatever divides by their spread: refuses a constant, which has none.
 *
 * @throws   InputError wrong-length, too-few-values, not-finite; NumericError constant
 */
export function deviations(
  caller: string,
  name: string,
  values: ArrayLike<number>,
  requirement: Parameters<typeof finiteValues>[3],
): Float64Array {
  const checked = finiteValues(caller, name, values, requirement);
  if (checked.every((value) => value === checked[0])) {
    throw new NumericError({
      code: 'constant',
      where: `${caller}, ${name}`,
      expected: 'values that are not all equal',
      received: `${checked.length} times ${checked[0]}`,
      hint: 'A constant neither varies with anything nor resembles its own past.',
    });
  }
  const average = mean(checked);
  return checked.map((value) => value - average);
}
