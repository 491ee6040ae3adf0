import type { Caveat } from '../../contract/primitives.ts';
import { InputError } from '../../errors.ts';
import { twoLayerTables } from '../../quantities/two-layer-tables.ts';
import type { TwoLayerParameters } from './linear-response.ts';

/** Far beyond any planet; within them no intermediate result leaves the range of doubles. */
const bounds: Readonly<Record<keyof TwoLayerParameters, { low: number; high: number }>> = {
  heatCapacity: { low: 1e-6, high: 1e9 },
  deepHeatCapacity: { low: 1e-6, high: 1e9 },
  exchange: { low: 0, high: 1e6 },
  feedback: { low: 1e-9, high: 1e6 },
  efficacy: { low: 0, high: 1e3 },
};
export const parameterNames = Object.keys(bounds) as readonly (keyof TwoLayerParameters)[];

const published = twoLayerTables.flatMap(({ models }) => models);
const publishedRanges = parameterNames.map((name) => {
  const values = published.map((model) => model[name]);
  return { name, low: Math.min(...values), high: Math.max(...values) };
});

/**
 * The door of the two-layer model for one parameter of one run.
 *
 * @param place  where the value stands, when it is one of many
 * @throws   InputError no-restoring-feedback when λ is not above 0, out-of-range
 *
 * Checked  test/unit/climate/two-layer/check-parameters.test.ts (C: each bound)
 */
export function checkParameter(caller: string, name: keyof TwoLayerParameters, value: number, place?: number): number {
  const { low, high } = bounds[name];
  if (value >= low && value <= high) return value;
  const where = `${caller}, ${name}${place === undefined ? '' : `[${place}]`}`;
  if (name === 'feedback' && !(value > 0)) {
    throw new InputError({
      code: 'no-restoring-feedback',
      where,
      expected: 'a restoring feedback λ above 0 W m⁻² K⁻¹',
      received: String(value),
      hint: 'Without one the warming never ends and there is no equilibrium. Where a source counts feedbacks as positive when they add to the warming (α = −λ), give the value with its sign turned.',
    });
  }
  throw new InputError({
    code: 'out-of-range',
    where,
    expected: `a number from ${low} to ${high}`,
    received: String(value),
    hint: name.endsWith('eatCapacity')
      ? 'Heat capacities are in W yr m⁻² K⁻¹: divide J m⁻² K⁻¹ by 3.156e7.'
      : 'Check the unit and the sign.',
  });
}

/** The same door for one parameter of many runs. @throws as `checkParameter`, naming the first that is refused */
export function checkParameters(caller: string, name: keyof TwoLayerParameters, values: Float64Array): void {
  const { low, high } = bounds[name];
  for (let place = 0; place < values.length; place++) {
    const value = values[place]!;
    if (!(value >= low && value <= high)) checkParameter(caller, name, value, place);
  }
}

/**
 * Doubts about parameters: those outside the published sets of climate models, and those that make another model of it.
 *
 * @returns  caveats outside-published, no-exchange, no-efficacy
 *
 * Checked  test/unit/climate/two-layer/check-parameters.test.ts (C: on and off at the ends of the tables)
 */
export function parameterCaveats(
  columns: Readonly<Record<keyof TwoLayerParameters, readonly number[] | Float64Array>>,
): Caveat[] {
  const caveats: Caveat[] = [];
  const outside = publishedRanges.filter(({ name, low, high }) => columns[name].some((v) => v < low || v > high));
  if (outside.length > 0) {
    const ranges = outside.map(({ name, low, high }) => `${name} ${low} to ${high}`).join(', ');
    caveats.push({
      code: 'outside-published',
      detail: `Outside the ${published.length} published sets for climate models (${ranges}).`,
    });
  }
  if (columns.exchange.includes(0)) {
    caveats.push({ code: 'no-exchange', detail: 'Without heat exchange the deep ocean stays as it was.' });
  }
  if (columns.efficacy.includes(0)) {
    caveats.push({
      code: 'no-efficacy',
      detail: 'With an efficacy of 0 the deep ocean takes up heat without cooling the surface.',
    });
  }
  return caveats;
}
