/** Text, or numbers (one or several) as a NetCDF attribute holds them. */
export type Attributes = Readonly<Record<string, string | readonly number[]>>;

export interface Dimension {
  name: string;
  size: number;
}

/** A variable of a NetCDF file, its values in the order of its dimensions, the last one running fastest. */
export interface Variable {
  name: string;
  dimensions: readonly Dimension[];
  attributes: Attributes;
  /** As stored, before any scaling; null for text and for more values than are read here. */
  values: ArrayLike<number> | null;
}

/** A NetCDF file, of whichever version, unpacked. */
export interface VariableFile {
  fileName: string;
  format: 'NetCDF-3' | 'NetCDF-4';
  attributes: Attributes;
  variables: readonly Variable[];
}

/** Values of all variables together, about 200 MB: monthly fields on a grid of 2.8° for 160 years are half of it. */
export const maxValues = 25_000_000;

/** The text of an attribute; empty when it is absent or holds numbers. */
export function textOf(attributes: Attributes, name: string): string {
  const value = attributes[name];
  return typeof value === 'string' ? value : '';
}

/** The numbers of an attribute; none when it is absent or holds text that is no number. */
export function numbersOf(attributes: Attributes, name: string): readonly number[] {
  const value = attributes[name] ?? [];
  if (typeof value !== 'string') return value;
  const number = Number(value);
  return value.trim() === '' || Number.isNaN(number) ? [] : [number];
}
