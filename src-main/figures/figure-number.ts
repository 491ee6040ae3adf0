import type { Interval } from '../contract/primitives.ts';

/** A number with a fixed count of decimals and a true minus sign; never "−0". */
export function figureNumber(value: number, decimals: number): string {
  const digits = Math.abs(value).toFixed(decimals);
  return value < 0 && Number(digits) !== 0 ? `−${digits}` : digits;
}

/** Both ends of an interval; ∞ stands at an end without a limit. */
export function figureRange(range: Pick<Interval, 'low' | 'high'>, decimals: number): string {
  const low = range.low === null ? '−∞' : figureNumber(range.low, decimals);
  const high = range.high === null ? '∞' : figureNumber(range.high, decimals);
  return `${low} – ${high}`;
}
