export interface Domain {
  readonly low: number;
  readonly high: number;
}

/** Round positions on an axis: multiples of 1, 2 or 5 times a power of ten, as near to `count` of them as can be. */
export function axisTicks({ low, high }: Domain, count: number): number[] {
  const step = roundStep(high - low, count);
  const first = Math.ceil(low / step - 1e-9);
  const last = Math.floor(high / step + 1e-9);
  // Multiplying, not adding up: 0.1 + 0.2 is no tick.
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) =>
    Number(((first + index) * step).toPrecision(12)),
  );
}

function roundStep(length: number, count: number): number {
  const power = 10 ** Math.floor(Math.log10(length / count));
  const miss = (factor: number) => Math.abs(length / (factor * power) - count);
  const best = [1, 2, 5, 10].reduce((nearest, factor) => (miss(factor) < miss(nearest) ? factor : nearest));
  return best * power;
}

/** Decimals that tell values apart on an axis of this length: two more digits than its leading one. */
export function axisDecimals({ low, high }: Domain): number {
  return Math.min(12, Math.max(0, 2 - Math.floor(Math.log10(high - low))));
}

/** A domain with room at both ends; never empty. */
export function paddedDomain(values: readonly number[], share: number): Domain {
  // Not spread into arguments: a series can be longer than an argument list.
  const low = values.reduce((least, value) => Math.min(least, value), Infinity);
  const high = values.reduce((most, value) => Math.max(most, value), -Infinity);
  const length = high - low;
  const margin = length > 0 ? length * share : Math.max(Math.abs(low) * 0.1, 0.5);
  return { low: low - margin, high: high + margin };
}
