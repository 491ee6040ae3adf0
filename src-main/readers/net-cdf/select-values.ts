import type { TimeAxis } from './time-axis.ts';
import { areaMean } from './area-mean.ts';
import { type Variable, type VariableFile, numbersOf, textOf } from './variable-file.ts';

/** One value for each step of the time axis, with what was done to get it; or why there is none, in words. */
export type Selected = { values: (number | null)[]; notes: string[] } | { refusal: string };

const poleToPoleDeg = 170;
const aroundDeg = 350;
/** Fill values are 1e20 or larger where the file does not declare them: no quantity here is. */
const largestTrueValue = 1e19;

/** The values of a variable in time: as they are, or the area mean of a field on latitudes and longitudes. */
export function selectValues(file: VariableFile, variable: Variable, timeDimension: string, axis: TimeAxis): Selected {
  const { dimensions, values } = variable;
  if (values === null) return { refusal: 'holds text, or more values than are read here' };
  const decode = decoderOf(variable);
  const others = dimensions.filter(({ name, size }) => name !== timeDimension && size !== 1);
  const strides = stridesOf(variable);
  const stride = (name: string): number => strides.get(name) ?? 0;
  if (others.length === 0) {
    return {
      values: axis.places.map((_, time) => decode(values[time * stride(timeDimension)] ?? Number.NaN)),
      notes: [],
    };
  }
  const latitude = others.find(({ name }) => coordinatesOf(file, name, 'latitude') !== null);
  const longitude = others.find(({ name }) => coordinatesOf(file, name, 'longitude') !== null);
  const rest = others.filter((dimension) => dimension !== latitude && dimension !== longitude);
  if (latitude === undefined || rest.length > 0) {
    const listed = (rest.length > 0 ? rest : others).map(({ name, size }) => `${name} (${size})`).join(', ');
    return { refusal: `depends on ${listed} beside time: select one, or average over them, before the import` };
  }
  const latitudesDeg = coordinatesOf(file, latitude.name, 'latitude') ?? [];
  const longitudesDeg = longitude ? coordinatesOf(file, longitude.name, 'longitude') : null;
  const nLongitudes = longitude?.size ?? 1;
  const { means, leastShare } = areaMean({
    nTimes: axis.places.length,
    latitudesDeg,
    nLongitudes,
    at: (time, row, column) =>
      decode(
        values[
          time * stride(timeDimension) + row * stride(latitude.name) + column * (longitude ? stride(longitude.name) : 0)
        ] ?? Number.NaN,
      ),
  });
  const where = regionOf(latitudesDeg, longitudesDeg);
  const least = `at least ${(100 * leastShare).toFixed(1)} % of its area has a value`;
  return {
    values: means,
    notes: [
      `“${variable.name}” is a field of ${latitudesDeg.length} latitudes${longitude ? ` and ${nLongitudes} longitudes` : ''}; the series is its area mean over ${where}, with weights cos(latitude); ${least}. For cells of other shapes, average with the provider’s cell areas first.`,
    ],
  };
}

/** Turns a stored number into a value: fill values and those out of the valid range are none; packed ones are unpacked. */
function decoderOf({ attributes }: Variable): (stored: number) => number | null {
  const fills = [...numbersOf(attributes, '_FillValue'), ...numbersOf(attributes, 'missing_value')];
  const [rangeLow, rangeHigh] = numbersOf(attributes, 'valid_range');
  const low = numbersOf(attributes, 'valid_min')[0] ?? rangeLow ?? -Infinity;
  const high = numbersOf(attributes, 'valid_max')[0] ?? rangeHigh ?? Infinity;
  const [scale = 1] = numbersOf(attributes, 'scale_factor');
  const [offset = 0] = numbersOf(attributes, 'add_offset');
  return (stored) => {
    const isValue = stored >= low && stored <= high && Math.abs(stored) < largestTrueValue;
    // A fill value may be declared in double precision for values in single.
    return !isValue || fills.some((fill) => stored === fill || stored === Math.fround(fill))
      ? null
      : stored * scale + offset;
  };
}

/** How far apart neighbours along each dimension are stored. */
function stridesOf({ dimensions }: Variable): Map<string, number> {
  const strides = new Map<string, number>();
  let stride = 1;
  for (const { name, size } of dimensions.toReversed()) {
    strides.set(name, stride);
    stride *= size;
  }
  return strides;
}

function coordinatesOf(file: VariableFile, dimension: string, kind: 'latitude' | 'longitude'): number[] | null {
  const letter = kind === 'latitude' ? 'n' : 'e';
  const found = file.variables.find(({ name, dimensions, attributes, values }) => {
    if (values === null || dimensions.length !== 1 || dimensions[0]?.name !== dimension) return false;
    const isUnit = new RegExp(`^degrees?_?${letter}`, 'i').test(textOf(attributes, 'units'));
    return isUnit || textOf(attributes, 'standard_name') === kind || name.toLowerCase() === kind;
  });
  return found?.values ? Array.from(found.values) : null;
}

function regionOf(latitudesDeg: readonly number[], longitudesDeg: readonly number[] | null): string {
  const [south, north] = reachOf(latitudesDeg);
  const [west, east] = longitudesDeg ? reachOf(longitudesDeg) : [0, 360];
  if (north - south >= poleToPoleDeg && east - west >= aroundDeg) return 'the whole globe';
  const latitudes = `latitudes ${Math.max(-90, south).toFixed(1)}° to ${Math.min(90, north).toFixed(1)}°`;
  return east - west >= aroundDeg ? latitudes : `${latitudes}, longitudes ${west.toFixed(1)}° to ${east.toFixed(1)}°`;
}

/** From the outer edge of the first cell to that of the last. */
function reachOf(coordinates: readonly number[]): [number, number] {
  const sorted = coordinates.toSorted((a, b) => a - b);
  const [first = 0, last = 0] = [sorted[0], sorted.at(-1)];
  const half = sorted.length > 1 ? (last - first) / (sorted.length - 1) / 2 : 0;
  return [first - half, last + half];
}
