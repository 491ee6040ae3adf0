import type { StemFigure } from '../contract/figure.ts';
import { formatInterval, formatNumber } from '../quantities/notation.ts';
import { axisDecimals } from './axis.ts';
import { shortQuantity, stemDomain } from './stem-layout.ts';

/** The stem in words, for readers who do not see it: the same numbers in the same order. */
export function stemDescription(figure: StemFigure): string {
  const decimals = axisDecimals(stemDomain(figure));
  const { stated, recomputed, rows, bands } = figure;
  const unit = figure.unit === '1' ? '' : ` ${figure.unit}`;
  const row = ({ label, value, interval, quantity, isCumulative }: StemFigure['rows'][number]) =>
    `${isCumulative ? 'then ' : ''}${label}: ${formatNumber(value, { decimals })}` +
    (interval ? ` (${formatInterval(interval, '', decimals)})` : '') +
    `, ${shortQuantity(quantity)}`;
  return [
    `${stated.text}${unit}`,
    recomputed
      ? `recomputed as stated ${formatNumber(recomputed.value, { decimals })}` +
        (recomputed.interval ? ` (${formatInterval(recomputed.interval, '', decimals)})` : '')
      : 'not recomputed yet',
    ...rows.map(row),
    ...bands.map((band) => `published ${band.label}: ${formatInterval(band, '', decimals)}`),
  ].join('; ');
}
