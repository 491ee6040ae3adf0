import fc from 'fast-check';

/**
 * Rows for properties that must hold whatever the data: x grows like time, with noise; y is a line and noise. Whole
 * thousandths, so that no example is near an exact fit by accident of rounding.
 */
export const drawnRecord = fc
  .array(fc.record({ a: fc.integer({ min: -400, max: 400 }), b: fc.integer({ min: -9000, max: 9000 }) }), {
    minLength: 14,
    maxLength: 30,
  })
  .map((noise) => ({
    x: noise.map(({ a }, t) => t + a / 1000),
    y: noise.map(({ b }, t) => 0.4 * t + b / 1000),
  }));

/** A permutation of so many rows. */
export const drawnOrder = (nRows: number, key: number): number[] =>
  Array.from({ length: nRows }, (_, row) => row).sort(
    (a, b) => Math.sin(key + 7.3 * a) - Math.sin(key + 7.3 * b) || a - b,
  );

export const inOrder = (values: readonly number[], order: readonly number[]): number[] =>
  order.map((row) => values[row] ?? NaN);

/** Units of measurement: powers of two change no digit, the others do. */
export const units = fc.constantFrom(0.125, 3, 1000);
