import type { Dataset, Group } from 'h5wasm';
import { withinTime } from '../within-time.ts';
import { damagedNetCdf } from './damaged-net-cdf.ts';
import { type Attributes, type Dimension, type Variable, type VariableFile, maxValues } from './variable-file.ts';

/** Groups in groups in groups: deeper ones are of no file that holds a time series. */
const maxDepth = 4;
/** A file of links that lead in circles has an end too. */
const maxEntities = 2000;
/** How NetCDF-4 marks a dimension that has no coordinates. */
const noVariable = /^This is a netCDF dimension but not a netCDF variable/;

/** Ten times as long as reading takes where nothing else runs. */
const leastTimeMs = 3000;
const leastBytesPerMs = 2000;

/** How much may still be unpacked. */
interface Room {
  nValues: number;
  nEntities: number;
}

let nOpened = 0;

/**
 * Opens a NetCDF-4 file (HDF5 underneath) with the HDF5 library itself, which runs in memory and knows no disk.
 *
 * @throws InputError `damaged-file`
 */
export async function openNetCdf4(fileName: string, bytes: Uint8Array): Promise<VariableFile> {
  const { File, ready } = await import('h5wasm');
  const { FS, activate_throwing_error_handler: throwErrors } = await ready;
  throwErrors();
  nOpened += 1;
  const place = `/received-${nOpened}.nc`;
  FS.writeFile(place, bytes);
  let file: InstanceType<typeof File> | null = null;
  try {
    // In a damaged file the library may follow its references round in circles.
    return withinTime(timeLimitMs(bytes.length), () => {
      file = new File(place, 'r');
      const room: Room = { nValues: maxValues, nEntities: maxEntities };
      const variables = variablesOf(file, '', room, 0);
      return { fileName, format: 'NetCDF-4', attributes: attributesOf(file), variables };
    });
  } catch {
    throw damagedNetCdf(fileName, 'an HDF5 file that cannot be read to its end');
  } finally {
    close(file);
    FS.unlink(place);
  }
}

function timeLimitMs(nBytes: number): number {
  return leastTimeMs + Math.ceil(nBytes / leastBytesPerMs);
}

function close(file: { close(): unknown } | null): void {
  try {
    withinTime(leastTimeMs, () => file?.close());
  } catch {
    // A damaged file may not close either; the next one is opened under another name.
  }
}

function variablesOf(group: Group, path: string, room: Room, depth: number): Variable[] {
  return group.keys().flatMap((key): Variable[] => {
    room.nEntities -= 1;
    const entity = room.nEntities >= 0 ? group.get(key) : null;
    const name = path === '' ? key : `${path}/${key}`;
    if (entity === null) return [];
    if ('keys' in entity) return depth < maxDepth ? variablesOf(entity, name, room, depth + 1) : [];
    return 'shape' in entity ? variableOf(entity, name, room) : [];
  });
}

function variableOf(dataset: Dataset, name: string, room: Room): Variable[] {
  const { shape } = dataset;
  const attributes = attributesOf(dataset);
  if (shape === null || noVariable.test(String(attributes.NAME ?? ''))) return [];
  const isScale = attributes.CLASS === 'DIMENSION_SCALE' && shape.length === 1;
  const dimensions = shape.map((size, index): Dimension => {
    const [scale] = isScale ? [] : dataset.get_attached_scales(index);
    return { name: scale?.replace(/^\//, '') ?? (isScale ? name : `dimension ${index + 1} of ${name}`), size };
  });
  const n = shape.reduce((product, size) => product * size, 1);
  room.nValues -= n;
  return [{ name, dimensions, attributes, values: room.nValues >= 0 ? numbersIn(dataset.value) : null }];
}

/** Typed arrays as they are, 64-bit integers as numbers; null for text and compound values. */
function numbersIn(value: unknown): ArrayLike<number> | null {
  if (typeof value === 'number') return [value];
  if (typeof value === 'bigint') return [Number(value)];
  if (value instanceof BigInt64Array || value instanceof BigUint64Array) return Float64Array.from(value, Number);
  if (!ArrayBuffer.isView(value) || value instanceof DataView) return null;
  return value as Float32Array | Float64Array | Int32Array;
}

function attributesOf({ attrs }: Pick<Dataset, 'attrs'> | Pick<Group, 'attrs'>): Attributes {
  const entries = Object.entries(attrs).flatMap(([name, attribute]): [string, string | readonly number[]][] => {
    // References between variables hold nothing to be shown, and are slow to unpack.
    if (name === 'REFERENCE_LIST' || name === 'DIMENSION_LIST') return [];
    const { value } = attribute;
    if (typeof value === 'string') return [[name, value]];
    if (Array.isArray(value) && value.every((part) => typeof part === 'string')) return [[name, value.join(' ')]];
    const numbers = numbersIn(value);
    return numbers === null ? [] : [[name, Array.from(numbers)]];
  });
  return Object.fromEntries(entries);
}
