export type DecimalMark = '.' | ',';

const withPoint = /^[+-]?(\d+\.?\d*|\.\d+)([eEdD][+-]?\d{1,3})?$/;
const withComma = /^[+-]?(\d+(,\d+)?|,\d+)([eE][+-]?\d{1,3})?$/;

/**
 * The number that a cell holds, or null when it holds none. Accepts leading-dot decimals (-.19), the typographic minus,
 * powers of ten and Fortran's D exponent; thousands separators are not accepted, because they cannot be told from
 * decimal commas.
 */
export function parseNumber(cell: string, decimalMark: DecimalMark): number | null {
  const text = cell.startsWith('−') ? `-${cell.slice(1)}` : cell;
  if (!(decimalMark === '.' ? withPoint : withComma).test(text)) return null;
  const value = Number(decimalMark === '.' ? text.replace(/d/i, 'e') : text.replace(',', '.'));
  return Number.isFinite(value) ? value : null;
}
