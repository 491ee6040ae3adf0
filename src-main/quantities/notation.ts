/**
 * How Footing sets numbers in text, tables and figures: a true minus, a thin space before units, uncertainty to one
 * significant digit (two when it starts with 1). One place, so that a number reads the same on every screen and in
 * the report. No imports: the screens use it too.
 */

/** Thin, and not a place for a line break. */
export const thinSpace = '\u202f';

export interface NumberFormat {
  /** Digits after the decimal point. Wins over `significantDigits`. */
  decimals?: number;
  /** Used when `decimals` is absent. Default 3. */
  significantDigits?: number;
  /** Set a plus before positive numbers, for effects and differences. */
  withSign?: boolean;
}

/**
 * A number with a true minus, digits as asked; very large and very small ones with a power of ten. A number in place of
 * the format means decimals. A number that does not exist (null) is a dash.
 */
export function formatNumber(value: number | null, format: NumberFormat | number = {}): string {
  if (value === null) return '–';
  if (Number.isNaN(value)) return 'not a number';
  if (!Number.isFinite(value)) return value > 0 ? '∞' : '−∞';
  const {
    decimals,
    significantDigits = 3,
    withSign = false,
  } = typeof format === 'number' ? { decimals: format } : format;
  const magnitude = Math.abs(value);
  const digits =
    decimals === undefined ? significantText(magnitude, significantDigits) : fixedText(magnitude, decimals);
  const isShownAsZero = !/[1-9]/.test(digits);
  const sign = isShownAsZero ? '' : value < 0 ? '−' : withSign ? '+' : '';
  return sign + digits;
}

/** A number with its unit; "1" is the unit of plain numbers and is not shown. */
export function formatQuantity(value: number, unit: string, format: NumberFormat | number = {}): string {
  return withUnit(formatNumber(value, format), unit);
}

/** Text of a number, and its unit after a thin space. */
export function withUnit(text: string, unit: string): string {
  return unit === '' || unit === '1' ? text : `${text}${thinSpace}${unit}`;
}

/** `1.9 ± 0.2 K per doubling`: the uncertainty decides how many digits both show. */
export function formatWithUncertainty(value: number, uncertainty: number | null, unit: string): string {
  if (uncertainty === null || !Number.isFinite(uncertainty) || uncertainty <= 0) return formatQuantity(value, unit);
  const place = lastPlaceShown(uncertainty);
  return withUnit(`${atPlace(value, place)} ± ${atPlace(uncertainty, place)}`, unit);
}

/** Decimals that suit a value known to this uncertainty; 0 where only whole tens or more are known. */
export function decimalsFor(uncertainty: number): number {
  return Math.max(0, -lastPlaceShown(uncertainty));
}

/** The fewest decimals, up to six, that show every one of these numbers as it is. */
export function decimalsOf(values: readonly (number | null)[]): number {
  const decimals = values.map((value) => /\.(\d+)$/.exec((value ?? 0).toFixed(6).replace(/0+$/, ''))?.[1]?.length ?? 0);
  return Math.max(0, ...decimals);
}

export interface FormattableInterval {
  /** null: unbounded. */
  low: number | null;
  high: number | null;
  levelPercent?: number | null;
}

/** `1.6 – 4.8 K per doubling`; an open end is called unbounded. */
export function formatInterval(interval: FormattableInterval, unit = '', decimals?: number): string {
  const { low, high } = interval;
  const shown = decimals ?? intervalDecimals(low, high);
  const end = (value: number | null): string =>
    value === null || !Number.isFinite(value) ? 'unbounded' : formatNumber(value, { decimals: shown });
  return withUnit(`${end(low)} – ${end(high)}`, unit);
}

/** `5–95 %` for the central 90 per cent. */
export function formatLevel(levelPercent: number): string {
  const tail = (100 - levelPercent) / 2;
  return `${trimmed(tail)}–${trimmed(100 - tail)}${thinSpace}%`;
}

/** `p = 0.012`, `p < 0.001`. */
export function formatP(p: number): string {
  if (p < 0.001) return 'p < 0.001';
  if (p >= 0.995) return 'p > 0.99';
  return `p = ${p < 0.0995 ? p.toFixed(3) : p.toFixed(2)}`;
}

/** A share as per cent: `61 %`. */
export function formatShare(share: number, decimals = 0): string {
  return withUnit(formatNumber(share * 100, { decimals }), '%');
}

/** Years are names, not amounts: no grouping, a true minus. */
export function formatYear(year: number): string {
  return year < 0 ? `−${-year}` : `${year}`;
}

/** `1959–2019`, or the one year. */
export function formatYears(span: { start: number; end: number }): string {
  return span.start === span.end ? formatYear(span.start) : `${formatYear(span.start)}–${formatYear(span.end)}`;
}

/** A list of years with runs drawn together: `1963, 1970–1972`. */
export function formatYearList(years: readonly number[]): string {
  const runs: { start: number; end: number }[] = [];
  for (const year of [...years].sort((a, b) => a - b)) {
    const last = runs.at(-1);
    if (last && year <= last.end + 1) last.end = year;
    else runs.push({ start: year, end: year });
  }
  return runs.map(formatYears).join(', ');
}

/** Enough of a digest to compare by eye; the whole of it belongs in a tooltip. */
export function shortDigest(digest: string): string {
  return digest.length <= 12 ? digest : `${digest.slice(0, 6)}…${digest.slice(-4)}`;
}

/** The decimal place (power of ten) of the last digit that an uncertainty leaves meaningful. */
function lastPlaceShown(uncertainty: number): number {
  const two = uncertainty.toExponential(1);
  const one = uncertainty.toExponential(0);
  return two.startsWith('1') ? exponentOf(two) - 1 : one.startsWith('1') ? exponentOf(one) - 1 : exponentOf(one);
}

function atPlace(value: number, place: number): string {
  if (place <= 0) return formatNumber(value, { decimals: -place });
  const step = 10 ** place;
  return formatNumber(Math.round(value / step) * step, { decimals: 0 });
}

function intervalDecimals(low: number | null, high: number | null): number {
  if (low !== null && high !== null && high > low) return Math.max(0, 1 - exponentOf((high - low).toExponential(1)));
  const end = low ?? high;
  return end === null || end === 0 ? 0 : Math.max(0, 1 - exponentOf(end.toExponential(1)));
}

function significantText(magnitude: number, significantDigits: number): string {
  if (magnitude === 0) return '0';
  const rounded = magnitude.toExponential(significantDigits - 1);
  const exponent = exponentOf(rounded);
  if (exponent < -4 || exponent >= 7) {
    const [mantissa = ''] = rounded.split('e');
    return `${mantissa} × 10${superscript(exponent)}`;
  }
  return fixedText(Number(rounded), Math.max(0, significantDigits - 1 - exponent));
}

/** Digits in groups of three from 10 000 up; four-digit numbers stand as they are. */
function fixedText(magnitude: number, decimals: number): string {
  if (magnitude >= 1e21) return significantText(magnitude, Math.max(1, Math.min(decimals, 15)));
  const [whole = '0', fraction] = magnitude.toFixed(Math.min(decimals, 20)).split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, thinSpace) : whole;
  return fraction === undefined ? grouped : `${grouped}.${fraction}`;
}

function exponentOf(exponential: string): number {
  return Number(exponential.slice(exponential.indexOf('e') + 1));
}

function superscript(exponent: number): string {
  const digits = '⁰¹²³⁴⁵⁶⁷⁸⁹';
  return [...String(exponent)].map((mark) => (mark === '-' ? '⁻' : (digits[Number(mark)] ?? ''))).join('');
}

function trimmed(value: number): string {
  return String(Number(value.toFixed(2)));
}
