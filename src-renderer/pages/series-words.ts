import type { Series, SeriesQuantity } from '../../src-main/contract/series.ts';
import { formatYears } from '../../src-main/quantities/notation.ts';

/** Kinds of series: what they hold, and the units in which they are usually given. */
export const seriesQuantities: readonly { value: SeriesQuantity; label: string; units: readonly string[] }[] = [
  { value: 'temperature-anomaly', label: 'temperature anomaly', units: ['K', '°C', '0.01 °C', '°F'] },
  { value: 'temperature', label: 'temperature', units: ['K', '°C', '°F'] },
  { value: 'co2', label: 'CO₂ mole fraction', units: ['ppm'] },
  { value: 'forcing', label: 'radiative forcing', units: ['W/m²'] },
  { value: 'other', label: 'something else', units: [] },
];

export const seriesQuantityName = (quantity: SeriesQuantity): string =>
  seriesQuantities.find(({ value }) => value === quantity)?.label ?? quantity;

export const unitsOf = (quantity: SeriesQuantity): readonly string[] =>
  seriesQuantities.find(({ value }) => value === quantity)?.units ?? [];

type Extent = Pick<Series, 'step' | 'nPresent' | 'nMissing' | 'nAbsent' | 'partialYears'>;

export const stepName = ({ step }: Pick<Series, 'step'>): string => (step === 'year' ? 'annual' : 'monthly');

/** What a series lacks inside its span, in words. */
export function gapsText({ nMissing, nAbsent, partialYears }: Extent): string {
  const gaps = [
    nMissing > 0 ? `${nMissing} marked missing` : '',
    nAbsent > 0 ? `${nAbsent} without a row` : '',
    partialYears.length > 0 ? `${partialYears.length} part ${partialYears.length === 1 ? 'year' : 'years'}` : '',
  ].filter(Boolean);
  return gaps.length > 0 ? gaps.join(', ') : 'none';
}

export function baselineText({ quantity, baseline }: Pick<Series, 'quantity' | 'baseline'>): string {
  if (baseline) return formatYears(baseline);
  return quantity === 'temperature-anomaly' ? 'not known' : 'not needed';
}
