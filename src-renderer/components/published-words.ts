import type { PublishedValue } from '../../src-main/contract/finding.ts';
import { decimalsOf, formatInterval, formatNumber, withUnit } from '../../src-main/quantities/notation.ts';

/** How a published value came into the table, in words. */
export const provenanceWords: Readonly<Record<PublishedValue['provenance'], string>> = {
  seen: 'read in the publication',
  'second-hand': 'second-hand, from a text that cites it',
  memory: 'from memory: look it up before it decides',
};

/** As many decimals as the publication prints. */
export function printedDecimals({ best, ranges, limits }: PublishedValue): number {
  const ends = ranges.flatMap(({ interval: { low, high } }) => [low, high]);
  return decimalsOf([best, ...ends, ...limits.map(({ value }) => value)]);
}

/** Each range and each one-sided statement, in words: `very unlikely above 6.0`. */
export function rangeTexts(value: PublishedValue): { numbers: string; words: string }[] {
  const decimals = printedDecimals(value);
  return [
    ...value.ranges.map(({ interval, words }) => ({ numbers: formatInterval(interval, '', decimals), words })),
    ...value.limits.map(({ term, side, value: bound }) => ({
      numbers: `${side} ${formatNumber(bound, decimals)}`,
      words: term,
    })),
  ];
}

/** A published value as it is cited in a text: number, ranges with their level, edition, place, and how it is known. */
export function citationText(value: PublishedValue): string {
  const best = value.best === null ? [] : [withUnit(formatNumber(value.best, printedDecimals(value)), value.unit)];
  const ranges = rangeTexts(value).map(({ numbers, words }) => `${words} ${numbers}`);
  const unit = best.length === 0 ? ` ${value.unit}` : '';
  const numbers = [...best, ...ranges].join('; ') + unit;
  return `${value.label}: ${numbers}. ${value.edition}, ${value.source} (${provenanceWords[value.provenance]}).`;
}
