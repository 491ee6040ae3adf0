import { type DecimalMark, parseNumber } from '../parse-number.ts';

const dateLike =
  /^(\d{4}[-/.]\d{1,2}([-/.]\d{1,2}([T ]\d{1,2}:.*)?)?|\d{1,2}[-/.](\d{1,2}[-/.])?\d{4}|\d{4}[-/ ]?[a-z]{3,9}|[a-z]{3,9}[-/ ]?\d{4})$/i;

/** Whether a cell holds a number or a date, as cells of rows do and cells of headers do not. */
export function isDataCell(cell: string, decimalMark: DecimalMark): boolean {
  return parseNumber(cell, decimalMark) !== null || dateLike.test(cell);
}

/** The one kind of header that is full of numbers: a word, then the months 1 to 12. */
export function isMonthNumberHeader([first = '', ...others]: readonly string[]): boolean {
  const months = others.slice(0, 12);
  return /\p{L}/u.test(first) && months.length === 12 && months.every((cell, place) => Number(cell) === place + 1);
}
