import { NetCDFReader } from 'netcdfjs';
import { damagedNetCdf } from './damaged-net-cdf.ts';
import { type Attributes, type Dimension, type Variable, type VariableFile, maxValues } from './variable-file.ts';

type Stored = NetCDFReader['variables'][number];

/** Types of the format, all big-endian; a `char` is text. */
const types: Readonly<Record<string, { nBytes: number; get: (view: DataView, at: number) => number }>> = {
  byte: { nBytes: 1, get: (view, at) => view.getInt8(at) },
  short: { nBytes: 2, get: (view, at) => view.getInt16(at) },
  int: { nBytes: 4, get: (view, at) => view.getInt32(at) },
  float: { nBytes: 4, get: (view, at) => view.getFloat32(at) },
  double: { nBytes: 8, get: (view, at) => view.getFloat64(at) },
};

/**
 * Opens a NetCDF-3 file (classic format, or with 64-bit offsets). The header is read by a library; the values, of which
 * a field in time has millions, where the header says that they lie.
 *
 * @throws InputError `damaged-file`
 */
export function openNetCdf3(fileName: string, bytes: Uint8Array): VariableFile {
  try {
    const { header } = new NetCDFReader(Uint8Array.from(bytes).buffer);
    const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.length);
    const stepBytes = recordBytes(header);
    let nValues = 0;
    const variables = header.variables.map((variable): Variable => {
      const dimensions = dimensionsOf(header, variable);
      const n = dimensions.reduce((product, { size }) => product * size, 1);
      // Nothing is packed in this format: values that the file has no room for are not there.
      if (n > bytes.length) throw new RangeError(variable.name);
      nValues += n;
      return {
        name: variable.name,
        dimensions,
        attributes: attributesOf(variable.attributes),
        values: nValues <= maxValues ? valuesOf(view, variable, dimensions, stepBytes) : null,
      };
    });
    return { fileName, format: 'NetCDF-3', attributes: attributesOf(header.globalAttributes), variables };
  } catch {
    throw damagedNetCdf(fileName, 'a NetCDF-3 file that ends too early or contradicts itself');
  }
}

type Header = NetCDFReader['header'];

function dimensionsOf({ dimensions, recordDimension }: Header, variable: Stored): Dimension[] {
  return variable.dimensions.map((id) => {
    const { name = '', size = 0 } = dimensions[id] ?? {};
    return { name, size: id === recordDimension.id ? recordDimension.length : size };
  });
}

/** From one record to the next: what all recorded variables take, each filled up to four bytes unless it is alone. */
function recordBytes(header: Header): number {
  const sizes = header.variables
    .filter(({ record }) => record)
    .map((variable) =>
      dimensionsOf(header, variable)
        .slice(1)
        .reduce((product, { size }) => product * size, types[variable.type]?.nBytes ?? 1),
    );
  return sizes.length === 1 ? (sizes[0] ?? 0) : sizes.reduce((sum, nBytes) => sum + Math.ceil(nBytes / 4) * 4, 0);
}

/** @throws RangeError where the file ends before its values do */
function valuesOf(
  view: DataView,
  { type, offset, record }: Stored,
  dimensions: readonly Dimension[],
  stepBytes: number,
): Float64Array | null {
  const stored = types[type];
  if (stored === undefined) return null;
  const { nBytes, get } = stored;
  const nInStep = dimensions.slice(record ? 1 : 0).reduce((product, { size }) => product * size, 1);
  const nSteps = record ? (dimensions[0]?.size ?? 0) : 1;
  const values = new Float64Array(nSteps * nInStep);
  for (let step = 0; step < nSteps; step += 1) {
    const start = offset + step * stepBytes;
    for (let place = 0; place < nInStep; place += 1) values[step * nInStep + place] = get(view, start + place * nBytes);
  }
  return values;
}

function attributesOf(given: readonly { name: string; value: unknown }[]): Attributes {
  const entries = given.map(({ name, value }): [string, string | readonly number[]] => [
    name,
    typeof value === 'string' ? value.replaceAll('\0', '') : [value].flat().map(Number),
  ]);
  return Object.fromEntries(entries);
}
