import { NumericError } from '../errors.ts';
import { finiteValues, type ValuesRequirement } from './finite-values.ts';

/**
 * Finite values that are not all equal: the door of whatever divides by their spread, or would take a constant for
 * something known exactly.
 *
 * @returns  as `finiteValues`
 * @throws   InputError as `finiteValues`; NumericError constant
 */
export function varyingValues(
  caller: string,
  name: string,
  values: ArrayLike<number>,
  requirement: ValuesRequirement,
): Float64Array {
  const checked = finiteValues(caller, name, values, requirement);
  if (checked.some((value) => value !== checked[0])) return checked;
  throw new NumericError({
    code: 'constant',
    where: `${caller}, ${name}`,
    expected: 'values that are not all equal',
    received: `${checked.length} times ${checked[0]}`,
    hint: 'A constant neither varies with anything nor resembles its own past.',
  });
}
