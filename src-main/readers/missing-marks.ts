/** Words and signs that stand for "no value" in any column. */
const missingText = /^(|nan|n\/?a|#n\/?a|null|none|nd|n\.d\.|m|missing|-+|–|—|\*+|\.{1,3}|…)$/i;

export function isMissingText(cell: string): boolean {
  return missingText.test(cell);
}

/** Numbers that customarily stand for "no value" in published files. */
const customaryMarks: readonly number[] = [
  -99.9, -99.99, -99.999, -999, -999.9, -999.99, -999.999, -9999, -9999.9, -9999.99, -99999, -32768,
];
/** No series that is read here has values as large: 1e20 and 9.97e36 are fill values. */
const largestTrueValue = 1e19;

/**
 * Which numbers of a column stand for "no value": the customary marks, unless other values of the column lie near them.
 * -99.9 among values from -2 to 2 is a mark; among -80 and -95 it is a value.
 */
export function numericMarksOf(column: readonly (number | null)[]): (value: number) => boolean {
  let lowest = Infinity;
  for (const value of column) {
    if (value !== null && value < lowest && !customaryMarks.includes(value)) lowest = value;
  }
  const marks = customaryMarks.filter((mark) => lowest > mark / 2);
  return (value) => Math.abs(value) >= largestTrueValue || marks.includes(value);
}

/** Where a true value cannot be negative (counts, standard deviations, uncertainties), every negative number is a mark. */
export function isNegative(value: number): boolean {
  return value < 0;
}
