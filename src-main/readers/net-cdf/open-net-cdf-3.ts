import { NetCDFReader } from 'netcdfjs';
import { damagedNetCdf } from './damaged-net-cdf.ts';
import { type Attributes, type Dimension, type Variable, type VariableFile, maxValues } from './variable-file.ts';

type Stored = NetCDFReader['variables'][number];

const bytesPerValue: Record<string, number> = { byte: 1, char: 1, short: 2, int: 4, float: 4, double: 8 };

/**
 * Opens a NetCDF-3 file (classic format, or with 64-bit offsets).
 *
 * @throws InputError `damaged-file`
 */
export function openNetCdf3(fileName: string, bytes: Uint8Array): VariableFile {
  try {
    const reader = new NetCDFReader(Uint8Array.from(bytes).buffer);
    const { recordDimension } = reader.header;
    const dimensionsOf = (variable: Stored): Dimension[] =>
      variable.dimensions.map((id) => {
        const { name = '', size = 0 } = reader.dimensions[id] ?? {};
        return { name, size: id === recordDimension.id ? recordDimension.length : size };
      });
    // The library takes each part with the bytes that fill it up to four; these are no values, and where one variable
    // alone has records they are not there.
    const bytesInStep = (variable: Stored): number =>
      dimensionsOf(variable)
        .slice(variable.record ? 1 : 0)
        .reduce((product, { size }) => product * size, bytesPerValue[variable.type] ?? 8);
    const [recorded, ...others] = reader.variables.filter(({ record }) => record);
    if (recorded && others.length === 0) recordDimension.recordStep = bytesInStep(recorded);
    let nValues = 0;
    const variables = reader.variables.map((variable): Variable => {
      const dimensions = dimensionsOf(variable);
      const n = dimensions.reduce((product, { size }) => product * size, 1);
      // Nothing is packed in this format: values that the file has no room for are not there.
      if (n * (bytesPerValue[variable.type] ?? 8) > bytes.length) throw new RangeError(variable.name);
      nValues += n;
      const isRead = variable.type !== 'char' && nValues <= maxValues;
      const values = isRead ? numbersIn(reader.getDataVariable({ ...variable, size: bytesInStep(variable) })) : null;
      return {
        name: variable.name,
        dimensions,
        attributes: attributesOf(variable.attributes),
        values: variable.type === 'byte' && values ? Int8Array.from(values) : values,
      };
    });
    return { fileName, format: 'NetCDF-3', attributes: attributesOf(reader.globalAttributes), variables };
  } catch {
    throw damagedNetCdf(fileName, 'a NetCDF-3 file that ends too early or contradicts itself');
  }
}

function numbersIn(values: readonly (string | number | readonly number[])[]): Float64Array {
  return Float64Array.from(values.flat().map(Number));
}

function attributesOf(given: readonly { name: string; value: unknown }[]): Attributes {
  const entries = given.map(({ name, value }): [string, string | readonly number[]] => [
    name,
    typeof value === 'string' ? value.replaceAll('\0', '') : [value].flat().map(Number),
  ]);
  return Object.fromEntries(entries);
}
