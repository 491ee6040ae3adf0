import { finiteValues } from '../../statistics/finite-values.ts';
import { InputError } from '../../errors.ts';
import { checkParameters, parameterNames } from './check-parameters.ts';
import type { TwoLayerParameters } from './linear-response.ts';

/** A parameter of an ensemble: one value for all members, or one for each. */
export type OneOrEach = number | ArrayLike<number>;
export type MemberColumns = Readonly<Record<keyof TwoLayerParameters, Float64Array>>;

/**
 * Parameters of the members of an ensemble, as columns of one length.
 *
 * @returns  [nMembers] each
 * @throws   InputError wrong-length, no-restoring-feedback, out-of-range, naming the parameter and the member
 *
 * Checked  test/unit/climate/two-layer/member-columns.test.ts (C: by hand)
 */
export function memberColumns(
  caller: string,
  parameters: Readonly<Record<keyof TwoLayerParameters, OneOrEach>>,
): MemberColumns {
  const lengths = parameterNames.flatMap((name) => lengthOf(parameters[name]));
  const nMembers = lengths[0] ?? 1;
  const columns = parameterNames.map((name) => {
    const column = memberColumn(caller, name, parameters[name], nMembers);
    checkParameters(caller, name, column);
    return [name, column] as const;
  });
  return Object.fromEntries(columns) as unknown as MemberColumns;
}

/** The parameters of one member. */
export function memberAt(columns: MemberColumns, member: number): TwoLayerParameters {
  return {
    heatCapacity: columns.heatCapacity[member]!,
    deepHeatCapacity: columns.deepHeatCapacity[member]!,
    exchange: columns.exchange[member]!,
    feedback: columns.feedback[member]!,
    efficacy: columns.efficacy[member]!,
  };
}

/** One column of an ensemble. @throws InputError wrong-length, not-finite, too-large */
export function memberColumn(caller: string, name: string, values: OneOrEach, nMembers: number): Float64Array {
  if (typeof values === 'number') return new Float64Array(nMembers).fill(values);
  if (values.length === nMembers) return finiteValues(caller, name, values);
  throw new InputError({
    code: 'wrong-length',
    where: `${caller}, ${name}`,
    expected: `one value, or ${nMembers} as for the other parameters`,
    received: `${values.length}`,
    hint: 'Each member of the ensemble needs its own value of each parameter that is not the same for all.',
  });
}

function lengthOf(values: OneOrEach): number[] {
  return typeof values === 'number' ? [] : [values.length];
}
