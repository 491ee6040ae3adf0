import type { UncertainInput } from '../contract/uncertain-input.ts';
import { withUnit } from './notation.ts';

/** An input with its range, all digits as the reviewer gave them, so that the figures can be worked out again. */
export function inputText({ best, low, high, levelPercent }: UncertainInput, unit: string): string {
  if (low === high) return `${withUnit(asGiven(best), unit)}, exact`;
  // Sums of decimals carry rounding errors; twelve digits are more than anybody gives.
  const [below, above] = [best - low, high - best].map((width) => Number(width.toPrecision(12)));
  const range =
    below === above
      ? withUnit(`${asGiven(best)} ± ${asGiven(below ?? NaN)}`, unit)
      : withUnit(`${asGiven(best)} (${asGiven(low)} to ${asGiven(high)})`, unit);
  return `${range}, ${levelWords(levelPercent)}`;
}

/** The central range of a level by its ends: 90 is 5–95 %. */
export function levelWords(levelPercent: number): string {
  const tail = (100 - levelPercent) / 2;
  const end = (percent: number) => String(Number(percent.toFixed(3)));
  return `${end(tail)}–${end(100 - tail)} %`;
}

function asGiven(value: number): string {
  return String(value).replace('-', '−');
}
